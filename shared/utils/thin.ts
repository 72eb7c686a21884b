/**
 * Pixel numbers that keep a curve's look with about `points` of them: the lowest and the highest value of each
 * stretch, in their order, and both ends.
 */
export function thinnedPixels(values: ArrayLike<number>, points: number): number[] {
  const n = values.length
  if (n <= points) return Array.from({ length: n }, (_, i) => i)
  const stretches = Math.floor((points - 2) / 2)
  const kept = new Set([0, n - 1])
  for (let s = 0; s < stretches; s++) {
    const from = Math.floor(s * n / stretches)
    const to = Math.floor((s + 1) * n / stretches)
    let low = from
    let high = from
    for (let i = from; i < to; i++) {
      if (values[i]! < values[low]!) low = i
      if (values[i]! > values[high]!) high = i
    }
    kept.add(low).add(high)
  }
  return [...kept].sort((a, b) => a - b)
}
