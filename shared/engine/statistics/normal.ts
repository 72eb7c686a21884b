import { erfc } from './erf'

/** Standard normal distribution function. */
export function normalCdf(z: number): number {
  return 0.5 * erfc(-z / Math.SQRT2)
}

/** Probability that |z| stays below k: 0.682689... at k = 1. */
export function normalCoverage(k: number): number {
  return 1 - erfc(k / Math.SQRT2)
}

/**
 * Standard normal quantile, 0 < p < 1: rational start (Abramowitz & Stegun 26.2.23, error < 5e-4), then Halley steps on erfc.
 * Relative error about 1e-14; -Infinity and Infinity at the ends.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0)) return -Infinity
  if (p >= 1) return Infinity
  if (p === 0.5) return 0
  const tail = Math.min(p, 1 - p)
  const t = Math.sqrt(-2 * Math.log(tail))
  let z = t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
  for (let i = 0; i < 4; i++) {
    const u = (0.5 * erfc(z / Math.SQRT2) - tail) * Math.sqrt(2 * Math.PI) * Math.exp(z * z / 2)
    z += u / (1 - z * u / 2)
  }
  return p < 0.5 ? -z : z
}
