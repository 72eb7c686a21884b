/** What one upload request may carry. */
export const sliceLimits = { files: 50, bytes: 64 * 1024 * 1024 }

/** Cuts a list into requests of at most so many files and bytes; a file above the byte limit travels alone. Order is kept. */
export function uploadSlices<T extends { size: number }>(files: T[], limits = sliceLimits): T[][] {
  const slices: T[][] = []
  let current: T[] = []
  let bytes = 0
  for (const file of files) {
    if (current.length && (current.length === limits.files || bytes + file.size > limits.bytes)) {
      slices.push(current)
      current = []
      bytes = 0
    }
    current.push(file)
    bytes += file.size
  }
  return current.length ? [...slices, current] : slices
}

/** Groups that share a key, in order of first appearance. */
export function groupBy<T>(items: T[], keyOf: (item: T) => string): T[][] {
  const groups = new Map<string, T[]>()
  for (const item of items) {
    const key = keyOf(item)
    const group = groups.get(key)
    if (group) group.push(item)
    else groups.set(key, [item])
  }
  return [...groups.values()]
}
