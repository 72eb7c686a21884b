/** Legendre polynomials P_0 ... P_order at points x, scaled so that [from, to] becomes [-1, 1]; one array per order. */
export function legendreBasis(x: Float64Array, from: number, to: number, order: number): Float64Array[] {
  const u = x.map(value => to > from ? (2 * value - from - to) / (to - from) : 0)
  const basis = [new Float64Array(x.length).fill(1)]
  if (order >= 1) basis.push(u)
  for (let k = 2; k <= order; k++) {
    // (k) P_k = (2k - 1) u P_k-1 - (k - 1) P_k-2
    basis.push(u.map((value, i) => ((2 * k - 1) * value * basis[k - 1][i] - (k - 1) * basis[k - 2][i]) / k))
  }
  return basis
}
