import { stirlingError } from './log-gamma'

/** x ln(x/m) + m - x without cancellation for x near m (Loader 2000). */
export function deviance(x: number, m: number): number {
  const d = x - m
  if (Math.abs(d) > 0.1 * (x + m)) return x === 0 ? m : x * Math.log(x / m) - d
  const v = d / (x + m)
  let sum = d * v
  let term = 2 * x * v
  for (let k = 3; k < 1000; k += 2) {
    term *= v * v
    const next = sum + term / k
    if (next === sum) break
    sum = next
  }
  return sum
}

/** m^a e^-m / Gamma(a + 1), a > 0, m >= 0; keeps its digits for large a (Loader 2000). */
export function poissonTerm(a: number, m: number): number {
  if (m === 0) return 0
  return Math.exp(-stirlingError(a) - deviance(a, m)) / Math.sqrt(2 * Math.PI * a)
}

/** x^a (1-x)^b / B(a, b), a, b > 0, with y = 1 - x given for its digits (Loader 2000). */
export function betaTerm(a: number, b: number, x: number, y: number): number {
  if (x <= 0 || y <= 0) return 0
  const n = a + b
  const exponent = stirlingError(n) - stirlingError(a) - stirlingError(b) - deviance(a, n * x) - deviance(b, n * y)
  return Math.exp(exponent) * Math.sqrt(a * b / (2 * Math.PI * n))
}
