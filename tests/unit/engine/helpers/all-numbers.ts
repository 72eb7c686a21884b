/** Paths of every number in plain data that is not finite; also of undefined inside arrays. */
export function notFinite(value: unknown, path = 'result'): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} = ${value}`]
  if (Array.isArray(value)) return value.flatMap((item, i) => item === undefined ? [`${path}[${i}] undefined`] : notFinite(item, `${path}[${i}]`))
  if (value && typeof value === 'object') return Object.entries(value).flatMap(([key, item]) => notFinite(item, `${path}.${key}`))
  return []
}
