import { qrFactor, qrTransposeTimes } from './qr'
import type { QrFactors } from './qr'
import { symmetricInverseFromCholesky } from './cholesky-solve'
import { solveUpper } from './triangular'

/** Solution of a linear least-squares problem. */
export interface LeastSquaresSolution {
  /** Parameters, length columns. */
  x: Float64Array
  /** Residuals b - A x, length rows. */
  residuals: Float64Array
  /** |b - A x|^2 */
  sumOfSquares: number
  /** (A^T A)^-1, row-major columns x columns: the covariance when b has unit covariance. */
  covariance: Float64Array
}

/**
 * Minimises |b - A x| by Householder QR with one step of iterative refinement.
 * Weighted problems: scale each row of A and b by 1/sigma first.
 *
 * @param a row-major rows x columns, rows >= columns
 * @param b length rows
 * @returns null when the columns of A are linearly dependent, or when rows < columns
 */
export function leastSquares(a: ArrayLike<number>, rows: number, columns: number, b: ArrayLike<number>): LeastSquaresSolution | null {
  if (rows < columns) return null
  const qr = qrFactor(a, rows, columns)
  if (qr.rank < columns) return null
  const x = solveUpper(qr.packed, columns, qrTransposeTimes(qr, b))
  const correction = solveUpper(qr.packed, columns, qrTransposeTimes(qr, residualsOf(a, rows, columns, b, x)))
  for (let j = 0; j < columns; j++) x[j] += correction[j]
  const residuals = residualsOf(a, rows, columns, b, x)
  let sumOfSquares = 0
  for (let i = 0; i < rows; i++) sumOfSquares += residuals[i] * residuals[i]
  return { x, residuals, sumOfSquares, covariance: covarianceFromQr(qr) }
}

/** (A^T A)^-1 = (R^T R)^-1 from a QR of full rank, row-major. */
export function covarianceFromQr(qr: QrFactors): Float64Array {
  const n = qr.columns
  const lower = new Float64Array(n * n)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) lower[i * n + j] = qr.packed[j * n + i]
  }
  return symmetricInverseFromCholesky(lower, n)
}

function residualsOf(a: ArrayLike<number>, rows: number, columns: number, b: ArrayLike<number>, x: Float64Array): Float64Array {
  const residuals = new Float64Array(rows)
  for (let i = 0; i < rows; i++) {
    let sum = b[i]
    for (let j = 0; j < columns; j++) sum -= a[i * columns + j] * x[j]
    residuals[i] = sum
  }
  return residuals
}
