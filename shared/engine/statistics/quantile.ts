/**
 * Solves cdf(x) = p for a continuous distribution on x > 0 by Newton's method for ln cdf in ln x inside a bracket:
 * tails are powers or exponentials of x, so that few steps lead from anywhere to probabilities of 1e-300.
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
  const tail = useLower ? lower : upper
  const wanted = useLower ? p : q
  let low = 0
  let high = Infinity
  let x = start
  for (let i = 0; i < 400; i++) {
    const probability = tail(x)
    // Positive where x is too large.
    const excess = (useLower ? 1 : -1) * logRatio(probability, wanted)
    if (excess === 0) return x
    if (excess > 0) high = x
    else low = x
    if (x === 0 || x === Infinity) return x
    const next = step(x, -excess * probability / (density(x) * x), low, high)
    if (Math.abs(next - x) <= 1e-15 * x) return next
    x = next
  }
  return x
}

/** ln(a / b), to full accuracy also for a near b. */
function logRatio(a: number, b: number): number {
  return Math.abs(a - b) < 0.5 * b ? Math.log1p((a - b) / b) : Math.log(a / b)
}

/** Longest step of ln x: far from the answer Newton's step may point anywhere. */
const longest = 60

function step(x: number, change: number, low: number, high: number): number {
  const newton = x * Math.exp(Math.max(-longest, Math.min(longest, change)))
  // Beyond the range of doubles the answer is their end.
  if (newton === 0 || newton === Infinity) return newton
  if (newton > low && newton < high) return newton
  if (high === Infinity) return x * 4
  return low === 0 ? x / 4 : Math.sqrt(low) * Math.sqrt(high)
}
