/** Sweeps after which the columns are orthogonal to rounding; six or seven are usual. */
const maxSweeps = 60

/**
 * Singular values of a small matrix by one-sided Jacobi rotations (Hestenes 1958; Golub & Van Loan 2013, 8.6.3):
 * small ones keep their digits where the columns have been scaled well.
 *
 * @param a row-major rows x columns, finite
 * @returns descending, length columns
 */
export function singularValues(a: ArrayLike<number>, rows: number, columns: number): Float64Array {
  const u = Float64Array.from({ length: rows * columns }, (_, i) => a[i])
  for (let sweep = 0; sweep < maxSweeps; sweep++) {
    let rotated = false
    for (let p = 0; p < columns - 1; p++) {
      for (let q = p + 1; q < columns; q++) if (rotate(u, rows, columns, p, q)) rotated = true
    }
    if (!rotated) break
  }
  const values = new Float64Array(columns)
  for (let j = 0; j < columns; j++) {
    let square = 0
    for (let i = 0; i < rows; i++) square += u[i * columns + j] ** 2
    values[j] = Math.sqrt(square)
  }
  return values.sort().reverse()
}

/** Makes columns p and q orthogonal; false when they are. */
function rotate(u: Float64Array, rows: number, columns: number, p: number, q: number): boolean {
  let pp = 0, qq = 0, pq = 0
  for (let i = 0; i < rows; i++) {
    const x = u[i * columns + p]
    const y = u[i * columns + q]
    pp += x * x
    qq += y * y
    pq += x * y
  }
  if (!(Math.abs(pq) > Number.EPSILON * Math.sqrt(pp * qq))) return false
  // tan of the rotation: 8.6.1 of the book, the smaller root.
  const zeta = (qq - pp) / (2 * pq)
  const t = (zeta < 0 ? -1 : 1) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta))
  const c = 1 / Math.sqrt(1 + t * t)
  for (let i = 0; i < rows; i++) {
    const x = u[i * columns + p]
    const y = u[i * columns + q]
    u[i * columns + p] = c * (x - t * y)
    u[i * columns + q] = c * (y + t * x)
  }
  return true
}
