import { betaTerm } from './saddle-point'

const maxTerms = 100_000
const tiny = 1e-300

/**
 * Regularised incomplete beta function I_x(a, b), a, b > 0, 0 <= x <= 1 (DLMF 8.17.2), by the continued fraction 8.17.22
 * on the side where it converges fast; relative error about 1e-13.
 *
 * @param y 1 - x, given when it is known better than the subtraction gives it
 */
export function incompleteBeta(a: number, b: number, x: number, y = 1 - x): number {
  if (x <= 0) return 0
  if (y <= 0) return 1
  return x < (a + 1) / (a + b + 2) ? betaSide(a, b, x, y) : 1 - betaSide(b, a, y, x)
}

function betaSide(a: number, b: number, x: number, y: number): number {
  return betaTerm(a, b, x, y) / a * betaFraction(a, b, x)
}

/** Modified Lentz evaluation. */
function betaFraction(a: number, b: number, x: number): number {
  let c = 1
  let d = 1 / guard(1 - (a + b) * x / (a + 1))
  let h = d
  for (let m = 1; m < maxTerms; m++) {
    const even = m * (b - m) * x / ((a + 2 * m - 1) * (a + 2 * m))
    d = 1 / guard(1 + even * d)
    c = guard(1 + even / c)
    h *= d * c
    const odd = -(a + m) * (a + b + m) * x / ((a + 2 * m) * (a + 2 * m + 1))
    d = 1 / guard(1 + odd * d)
    c = guard(1 + odd / c)
    const change = d * c
    h *= change
    if (Math.abs(change - 1) < 1e-16) break
  }
  return h
}

function guard(value: number): number {
  return Math.abs(value) < tiny ? tiny : value
}
