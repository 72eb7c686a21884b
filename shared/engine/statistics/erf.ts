import { lowerGamma, upperGamma } from './incomplete-gamma'

/** Error function (DLMF 7.11.1: P(1/2, x^2)); relative error about 1e-14. */
export function erf(x: number): number {
  return Math.sign(x) * lowerGamma(0.5, x * x)
}

/** Complementary error function; full relative accuracy in the tail x > 0. */
export function erfc(x: number): number {
  return x < 0 ? 1 + lowerGamma(0.5, x * x) : upperGamma(0.5, x * x)
}
