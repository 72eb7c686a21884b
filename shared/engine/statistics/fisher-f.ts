import { incompleteBeta } from './incomplete-beta'
import { positiveQuantile } from './quantile'
import { betaTerm } from './saddle-point'

/** P(F <= x) with m and n degrees of freedom (DLMF 8.17; Abramowitz & Stegun 26.6.2). */
export function fisherCdf(x: number, m: number, n: number): number {
  return x <= 0 ? 0 : incompleteBeta(m / 2, n / 2, m * x / (m * x + n), n / (m * x + n))
}

/** P(F > x). */
export function fisherTail(x: number, m: number, n: number): number {
  return x <= 0 ? 1 : incompleteBeta(n / 2, m / 2, n / (m * x + n), m * x / (m * x + n))
}

/**
 * x with P(F <= x) = p; 0 and Infinity at p = 0 and 1.
 *
 * @param q 1 - p, given when it is known better than the subtraction gives it
 */
export function fisherQuantile(p: number, m: number, n: number, q = 1 - p): number {
  if (!(p > 0)) return 0
  if (!(q > 0)) return Infinity
  const density = (x: number) => betaTerm(m / 2, n / 2, m * x / (m * x + n), n / (m * x + n)) / x
  return positiveQuantile(x => fisherCdf(x, m, n), x => fisherTail(x, m, n), density, p, q, 1)
}
