/**
 * Cholesky factor L of a symmetric positive definite matrix A = L L^T (Golub & Van Loan 2013, 4.2.5).
 *
 * @param a row-major n x n; only the lower triangle is read
 * @param n order, n >= 0
 * @param out receives L, row-major n x n, zeros above the diagonal; may be `a` itself
 * @returns L, or null when A is not numerically positive definite (or holds a non-finite number)
 */
export function cholesky(a: ArrayLike<number>, n: number, out: Float64Array = new Float64Array(n * n)): Float64Array | null {
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = a[i * n + j]
      for (let k = 0; k < j; k++) sum -= out[i * n + k] * out[j * n + k]
      if (j < i) {
        out[i * n + j] = sum / out[j * n + j]
      }
      else {
        if (!(sum > 0) || sum === Infinity) return null
        out[i * n + i] = Math.sqrt(sum)
      }
    }
    for (let j = i + 1; j < n; j++) out[i * n + j] = 0
  }
  return out
}
