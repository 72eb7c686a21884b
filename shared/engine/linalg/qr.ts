/** Householder QR of a tall matrix, kept in factored form. */
export interface QrFactors {
  rows: number
  columns: number
  /** Row-major rows x columns: R on and above the diagonal, Householder vectors below. */
  packed: Float64Array
  /** Leading element of each Householder vector. */
  heads: Float64Array
  /** 2 / |v|^2 of each Householder vector; 0 where no reflection was needed. */
  factors: Float64Array
  /** Number of columns that stand out of the span of those before them (relative tolerance rows x 2^-52). */
  rank: number
}

/**
 * QR factorisation by Householder reflections (Golub & Van Loan 2013, 5.2.1).
 *
 * @param a row-major rows x columns, rows >= columns
 */
export function qrFactor(a: ArrayLike<number>, rows: number, columns: number): QrFactors {
  const packed = Float64Array.from(a)
  const heads = new Float64Array(columns)
  const factors = new Float64Array(columns)
  const tolerance = rows * Number.EPSILON
  let rank = 0
  for (let k = 0; k < columns; k++) {
    if (reflectColumn(packed, rows, columns, k, heads, factors, tolerance)) rank++
  }
  return { rows, columns, packed, heads, factors, rank }
}

/** Makes column k zero below the diagonal; false when the column lies in the span of its predecessors. */
function reflectColumn(packed: Float64Array, rows: number, columns: number, k: number, heads: Float64Array, factors: Float64Array, tolerance: number): boolean {
  const above = columnLength(packed, columns, k, 0, k)
  const below = columnLength(packed, columns, k, k, rows)
  if (below === 0) return false
  const diagonal = packed[k * columns + k]
  const r = diagonal > 0 ? -below : below
  heads[k] = diagonal - r
  // |v|^2 = 2 r (r - diagonal), so 2 / |v|^2 = -1 / (r head)
  factors[k] = -1 / (r * heads[k])
  packed[k * columns + k] = r
  for (let j = k + 1; j < columns; j++) {
    let dot = heads[k] * packed[k * columns + j]
    for (let i = k + 1; i < rows; i++) dot += packed[i * columns + k] * packed[i * columns + j]
    dot *= factors[k]
    packed[k * columns + j] -= dot * heads[k]
    for (let i = k + 1; i < rows; i++) packed[i * columns + j] -= dot * packed[i * columns + k]
  }
  return below > tolerance * Math.hypot(above, below)
}

/** Length of rows from .. to-1 of column k; scaled only where squares would leave the range of doubles, since that is slow. */
function columnLength(packed: Float64Array, columns: number, k: number, from: number, to: number): number {
  let square = 0
  for (let i = from * columns + k; i < to * columns; i += columns) square += packed[i] * packed[i]
  if (square > 1e-280 && square < 1e280) return Math.sqrt(square)
  let length = 0
  for (let i = from * columns + k; i < to * columns; i += columns) length = Math.hypot(length, packed[i])
  return length
}

/**
 * Q^T b.
 *
 * @param b length rows
 * @returns a new array of length rows: first `columns` entries belong to R, the rest is the residual part
 */
export function qrTransposeTimes(qr: QrFactors, b: ArrayLike<number>): Float64Array {
  const { rows, columns, packed, heads, factors } = qr
  const y = Float64Array.from(b)
  for (let k = 0; k < columns; k++) {
    if (factors[k] === 0) continue
    let dot = heads[k] * y[k]
    for (let i = k + 1; i < rows; i++) dot += packed[i * columns + k] * y[i]
    dot *= factors[k]
    y[k] -= dot * heads[k]
    for (let i = k + 1; i < rows; i++) y[i] -= dot * packed[i * columns + k]
  }
  return y
}

/**
 * Q b.
 *
 * @param b length rows
 * @returns a new array of length rows
 */
export function qrTimes(qr: QrFactors, b: ArrayLike<number>): Float64Array {
  const { rows, columns, packed, heads, factors } = qr
  const y = Float64Array.from(b)
  for (let k = columns - 1; k >= 0; k--) {
    if (factors[k] === 0) continue
    let dot = heads[k] * y[k]
    for (let i = k + 1; i < rows; i++) dot += packed[i * columns + k] * y[i]
    dot *= factors[k]
    y[k] -= dot * heads[k]
    for (let i = k + 1; i < rows; i++) y[i] -= dot * packed[i * columns + k]
  }
  return y
}
