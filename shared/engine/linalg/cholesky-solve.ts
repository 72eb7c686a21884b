import { solveLower, solveLowerTransposed } from './triangular'

/**
 * Solves A x = b from the Cholesky factor of A.
 *
 * @param l the factor from `cholesky`, row-major n x n
 * @param b length n
 * @param out receives x, length n; may be `b` itself
 */
export function choleskySolve(l: ArrayLike<number>, n: number, b: ArrayLike<number>, out: Float64Array = new Float64Array(n)): Float64Array {
  return solveLowerTransposed(l, n, solveLower(l, n, b, out), out)
}

/**
 * The inverse of A from its Cholesky factor, for covariances that are themselves the answer; to solve, use `choleskySolve`.
 *
 * @param l the factor from `cholesky`, row-major n x n
 * @returns A^-1, row-major n x n, exactly symmetric
 */
export function symmetricInverseFromCholesky(l: ArrayLike<number>, n: number): Float64Array {
  const inverse = new Float64Array(n * n)
  const column = new Float64Array(n)
  for (let j = 0; j < n; j++) {
    column.fill(0)
    column[j] = 1
    choleskySolve(l, n, column, column)
    for (let i = j; i < n; i++) {
      inverse[i * n + j] = column[i]
      inverse[j * n + i] = column[i]
    }
  }
  return inverse
}
