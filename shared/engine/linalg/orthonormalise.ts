/**
 * Orthonormal basis of the span of `columns`, by Gram-Schmidt done twice (Björck 1994).
 * Columns that lie in the span of those before them (1e-12 of their length) give none.
 */
export function orthonormalise(columns: readonly Float64Array[]): Float64Array[] {
  const basis: Float64Array[] = []
  for (const column of columns) {
    const length = norm(column)
    const rest = removeComponents(column, basis)
    const left = norm(rest)
    if (left > 1e-12 * length) basis.push(rest.map(value => value / left))
  }
  return basis
}

/** The part of `vector` that is orthogonal to an orthonormal basis; a new array. */
export function removeComponents(vector: Float64Array, basis: readonly Float64Array[]): Float64Array {
  const rest = Float64Array.from(vector)
  for (let pass = 0; pass < 2; pass++) {
    for (const q of basis) {
      const share = dotProduct(rest, q)
      for (let i = 0; i < rest.length; i++) rest[i] -= share * q[i]
    }
  }
  return rest
}

export function dotProduct(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
  return sum
}

export function norm(a: Float64Array): number {
  return Math.sqrt(dotProduct(a, a))
}
