import { singularValues } from '../linalg/singular-values'
import { solveLower } from '../linalg/triangular'
import type { Linearisation } from './linearisation'

/**
 * Rank and condition of the Jacobian with columns of unit length, free parameters only; 2-norm, from its singular values.
 *
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(3, 4), sumOfSquares: 25 }
 * rankAndCondition(linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1]))).condition // => 1
 */
export function rankAndCondition({ free, r, resolution }: Linearisation): { rank: number, condition: number } {
  const k = free.length
  if (k === 0) return { rank: 0, condition: 1 }
  const values = singularValues(r, k, k)
  const rank = values.filter(value => value > values[0] * resolution).length
  return { rank, condition: rank < k ? Infinity : values[0] / values[k - 1] }
}

/**
 * (J^T J)^-1 times a variance factor from the R of the scaled Jacobian: columns of R^-T give it without an inverse of J^T J.
 *
 * @param factor 1, or sum of squares / dof
 * @returns row-major n x n, zero in rows and columns of parameters that are not free
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(3, 4), sumOfSquares: 25 }
 * covarianceOf(linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1])), 1) // => [0.25]
 */
export function covarianceOf({ free, lengths, r }: Linearisation, factor: number): Float64Array {
  const n = lengths.length
  const k = free.length
  const lower = new Float64Array(k * k)
  for (let a = 0; a < k; a++) for (let b = 0; b <= a; b++) lower[a * k + b] = r[b * k + a]
  // Column a of R^-T, so that C = (R^-1)(R^-T) is a sum of products of them.
  const inverse = Array.from({ length: k }, (_, a) => solveLower(lower, k, unit(k, a)))
  const covariance = new Float64Array(n * n)
  for (let a = 0; a < k; a++) {
    for (let b = 0; b <= a; b++) {
      let sum = 0
      for (let i = a; i < k; i++) sum += inverse[a][i] * inverse[b][i]
      const value = sum * factor / (lengths[free[a]] * lengths[free[b]])
      covariance[free[a] * n + free[b]] = value
      covariance[free[b] * n + free[a]] = value
    }
  }
  return covariance
}

function unit(k: number, at: number): Float64Array {
  const vector = new Float64Array(k)
  vector[at] = 1
  return vector
}
