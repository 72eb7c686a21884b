/**
 * Solves cdf(x) = p for a continuous distribution on x > 0 by Newton's method in ln x inside a bracket.
 *
 * @param lower cdf, increasing
 * @param upper its complement; the smaller of the two is compared, so that both tails keep their digits
 * @param density derivative of cdf
 * @param p probability, 0 < p < 1
 * @param q 1 - p, given for its digits
 * @param start a rough guess, > 0
 */
export function positiveQuantile(lower: (x: number) => number, upper: (x: number) => number, density: (x: number) => number, p: number, q: number, start: number): number {
  const useLower = p <= q
  const excess = (x: number) => useLower ? lower(x) - p : q - upper(x)
  let low = 0
  let high = Infinity
  let x = start
  for (let i = 0; i < 400; i++) {
    const difference = excess(x)
    if (difference === 0) return x
    if (difference > 0) high = x
    else low = x
    const next = step(x, difference, density(x), low, high)
    if (Math.abs(next - x) <= 1e-15 * x) return next
    x = next
  }
  return x
}

function step(x: number, difference: number, density: number, low: number, high: number): number {
  const newton = x * Math.exp(-difference / (density * x))
  if (newton > low && newton < high) return newton
  if (high === Infinity) return x * 4
  return low === 0 ? x / 4 : Math.sqrt(low * high)
}
