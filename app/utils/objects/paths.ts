type Tree = Record<string, unknown>
const isTree = (value: unknown): value is Tree => typeof value === 'object' && value !== null

/** The value at `settings.profile.fwhm`; undefined where the way ends. */
export const valueAt = (tree: unknown, path: string): unknown =>
  path.split('.').reduce<unknown>((branch, key) => isTree(branch) ? branch[key] : undefined, tree)

/** Puts a value there; the way to it must exist. */
export function putAt(tree: unknown, path: string, value: unknown): void {
  const keys = path.split('.')
  const last = keys.pop()!
  const branch = keys.length ? valueAt(tree, keys.join('.')) : tree
  if (isTree(branch)) branch[last] = value
}

export const sameValue = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

/** A copy without reactivity; forms hold plain data only. Numbers that are none stay none, which JSON would lose. */
export function plainCopy<T>(value: T): T {
  if (Array.isArray(value)) return value.map(item => plainCopy(item)) as T
  if (isTree(value)) return Object.fromEntries(Object.entries(value).map(([key, item]) => [key, plainCopy(item)])) as T
  return value
}
