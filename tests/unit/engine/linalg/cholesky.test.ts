import { expect, it } from 'vitest'
import { cholesky } from '#shared/engine/linalg/cholesky'
import { choleskySolve, symmetricInverseFromCholesky } from '#shared/engine/linalg/cholesky-solve'
import { solveLower, solveLowerTransposed, solveUpper } from '#shared/engine/linalg/triangular'
import { seededNormal } from '../helpers/random'

/** A random positive definite matrix G G^T + I. */
function positiveDefinite(n: number, seed: number): Float64Array {
  const normal = seededNormal(seed)
  const g = Float64Array.from({ length: n * n }, normal)
  return Float64Array.from({ length: n * n }, (_, at) => {
    const [i, j] = [Math.floor(at / n), at % n]
    let sum = i === j ? 1 : 0
    for (let k = 0; k < n; k++) sum += g[i * n + k] * g[j * n + k]
    return sum
  })
}

const times = (a: ArrayLike<number>, n: number, x: ArrayLike<number>) => Float64Array.from({ length: n }, (_, i) => {
  let sum = 0
  for (let k = 0; k < n; k++) sum += a[i * n + k] * x[k]
  return sum
})

it('factors a small matrix exactly (truth: by hand, [[4, 2], [2, 10]] = L L^T with L = [[2, 0], [1, 3]])', () => {
  expect([...cholesky([4, 2, 2, 10], 2)!]).toEqual([2, 0, 1, 3])
})

it('reads the lower triangle only and may work in place', () => {
  const a = Float64Array.of(4, 99, 2, 10)
  expect([...cholesky(a, 2, a)!]).toEqual([2, 0, 1, 3])
})

it.each([1, 2, 5, 30])('solves systems of order %i', (n) => {
  const a = positiveDefinite(n, n)
  const x = Float64Array.from({ length: n }, (_, i) => i - 1.5)
  const solved = choleskySolve(cholesky(a, n)!, n, times(a, n, x))
  for (let i = 0; i < n; i++) expect(solved[i]).toBeCloseTo(x[i], 9)
})

it('gives an inverse that is exactly symmetric and undoes the matrix', () => {
  const n = 6
  const a = positiveDefinite(n, 3)
  const inverse = symmetricInverseFromCholesky(cholesky(a, n)!, n)
  for (let i = 0; i < n; i++) {
    const product = times(a, n, inverse.subarray(i * n, i * n + n))
    for (let j = 0; j < n; j++) {
      expect(inverse[i * n + j]).toBe(inverse[j * n + i])
      expect(product[j]).toBeCloseTo(i === j ? 1 : 0, 10)
    }
  }
})

it.each([
  ['indefinite', [1, 2, 2, 1]],
  ['singular', [1, 1, 1, 1]],
  ['zero', [0, 0, 0, 0]],
  ['with a NaN', [1, 0, Number.NaN, 1]],
  ['infinite', [Infinity, 0, 0, 1]],
])('refuses a matrix that is %s', (_, a) => {
  expect(cholesky(a, 2)).toBeNull()
})

it('solves triangular systems from either side', () => {
  const l = [2, 0, 1, 3]
  expect([...solveLower(l, 2, [4, 11])]).toEqual([2, 3])
  expect([...solveLowerTransposed(l, 2, [7, 9])]).toEqual([2, 3])
  expect([...solveUpper([2, 1, 7, 0, 3, 7], 2, [7, 9], new Float64Array(2), 3)]).toEqual([2, 3])
})
