/**
 * Solves L x = b for a lower triangular L by forward substitution.
 *
 * @param l row-major n x n lower triangle with a non-zero diagonal
 * @param b length n
 * @param out receives x, length n; may be `b` itself
 */
export function solveLower(l: ArrayLike<number>, n: number, b: ArrayLike<number>, out: Float64Array = new Float64Array(n)): Float64Array {
  for (let i = 0; i < n; i++) {
    let sum = b[i]
    for (let k = 0; k < i; k++) sum -= l[i * n + k] * out[k]
    out[i] = sum / l[i * n + i]
  }
  return out
}

/**
 * Solves L^T x = b for a lower triangular L by back substitution.
 *
 * @param l row-major n x n lower triangle with a non-zero diagonal
 * @param b length n
 * @param out receives x, length n; may be `b` itself
 */
export function solveLowerTransposed(l: ArrayLike<number>, n: number, b: ArrayLike<number>, out: Float64Array = new Float64Array(n)): Float64Array {
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i]
    for (let k = i + 1; k < n; k++) sum -= l[k * n + i] * out[k]
    out[i] = sum / l[i * n + i]
  }
  return out
}

/**
 * Solves U x = b for an upper triangular U by back substitution.
 *
 * @param u row-major with `stride` columns; its leading n x n upper triangle is used
 * @param b length >= n
 * @param out receives x, length n; may be `b` itself
 */
export function solveUpper(u: ArrayLike<number>, n: number, b: ArrayLike<number>, out: Float64Array = new Float64Array(n), stride = n): Float64Array {
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i]
    for (let k = i + 1; k < n; k++) sum -= u[i * stride + k] * out[k]
    out[i] = sum / u[i * stride + i]
  }
  return out
}
