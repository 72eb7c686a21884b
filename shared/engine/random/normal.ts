import type { RandomGenerator } from './generator'

/**
 * Standard normal numbers by the polar method (Marsaglia & Bray 1964, SIAM Rev. 6, 260), two for each accepted point.
 * Which points are accepted is decided by exact arithmetic; only ln and sqrt can differ between machines, in the last digit.
 *
 * @returns a function whose calls give independent numbers of mean 0 and variance 1
 * @example
 * const draw = normalNumbers(seededGenerator(7))
 * draw() === normalNumbers(seededGenerator(7))() // => true
 */
export function normalNumbers(generator: RandomGenerator): () => number {
  let spare = 0
  let hasSpare = false
  return () => {
    if (hasSpare) {
      hasSpare = false
      return spare
    }
    for (;;) {
      const u = 2 * generator.uniform() - 1
      const v = 2 * generator.uniform() - 1
      const s = u * u + v * v
      if (s >= 1 || s === 0) continue
      const factor = Math.sqrt(-2 * Math.log(s) / s)
      spare = v * factor
      hasSpare = true
      return u * factor
    }
  }
}

/**
 * Normal numbers with a covariance, from its Cholesky factor: x = L z.
 *
 * @param factor L, row-major n x n lower triangle (`cholesky`)
 * @param n length of x
 * @param draw standard normal numbers
 * @param out receives x, length n, in the unit of L
 * @example
 * let next = 0
 * correlatedNormal([2, 0, 1, 1], 2, () => ++next) // => [2, 3]
 */
export function correlatedNormal(factor: ArrayLike<number>, n: number, draw: () => number, out: Float64Array = new Float64Array(n)): Float64Array {
  for (let i = 0; i < n; i++) out[i] = draw()
  // From the last row up, so that the z above are still there.
  for (let i = n - 1; i >= 0; i--) {
    let sum = 0
    for (let k = 0; k <= i; k++) sum += factor[i * n + k] * out[k]
    out[i] = sum
  }
  return out
}
