import { poissonTerm } from './saddle-point'

const maxTerms = 100_000
const tiny = 1e-300

/**
 * Regularised lower incomplete gamma function P(a, x), a > 0, x >= 0 (DLMF 8.2.4).
 * Series 8.7.1 below a + 1, Legendre's continued fraction 8.9.2 above; relative error about 1e-13.
 */
export function lowerGamma(a: number, x: number): number {
  if (x <= 0) return 0
  if (x === Infinity) return 1
  return x < a + 1 ? gammaSeries(a, x) : 1 - gammaFraction(a, x)
}

/** Regularised upper incomplete gamma function Q(a, x) = 1 - P(a, x), small tails to full relative accuracy. */
export function upperGamma(a: number, x: number): number {
  if (x <= 0) return 1
  if (x === Infinity) return 0
  return x < a + 1 ? 1 - gammaSeries(a, x) : gammaFraction(a, x)
}

function gammaSeries(a: number, x: number): number {
  let term = 1
  let sum = 1
  for (let n = 1; n < maxTerms; n++) {
    term *= x / (a + n)
    sum += term
    if (term < sum * 1e-17) break
  }
  return poissonTerm(a, x) * sum
}

/** Modified Lentz evaluation. */
function gammaFraction(a: number, x: number): number {
  let b = x + 1 - a
  let c = 1 / tiny
  let d = 1 / b
  let h = d
  for (let i = 1; i < maxTerms; i++) {
    const numerator = -i * (i - a)
    b += 2
    d = 1 / guard(numerator * d + b)
    c = guard(b + numerator / c)
    const change = c * d
    h *= change
    if (Math.abs(change - 1) < 1e-16) break
  }
  return poissonTerm(a, x) * a * h
}

function guard(value: number): number {
  return Math.abs(value) < tiny ? tiny : value
}
