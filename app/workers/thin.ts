/** At most about `points` pixels of a plot: of each stretch the lowest and the highest, so that no line is lost. */
export function thinnedPixels(values: ArrayLike<number>, points: number): number[] {
  const count = values.length
  if (count <= points) return Array.from({ length: count }, (_, index) => index)
  const stretch = Math.ceil((2 * count) / points)
  const kept: number[] = []
  for (let start = 0; start < count; start += stretch) {
    let low = start
    let high = start
    for (let index = start; index < Math.min(start + stretch, count); index++) {
      if (values[index]! < values[low]!) low = index
      if (values[index]! > values[high]!) high = index
    }
    kept.push(...(low === high ? [low] : [Math.min(low, high), Math.max(low, high)]))
  }
  return kept
}
