/**
 * The element that a sort would put at place n (0-based), by Hoare's selection (1961): a sort of all is not needed.
 *
 * @param values finite numbers; their order is changed
 */
export function nthSmallest(values: Float64Array, n: number): number {
  let low = 0
  let high = values.length - 1
  while (low < high) {
    const pivot = values[(low + high) >>> 1]
    let i = low
    let j = high
    while (i <= j) {
      while (values[i] < pivot) i++
      while (values[j] > pivot) j--
      if (i <= j) {
        [values[i], values[j]] = [values[j], values[i]]
        i++
        j--
      }
    }
    if (n <= j) high = j
    else if (n >= i) low = i
    else break
  }
  return values[n]
}
