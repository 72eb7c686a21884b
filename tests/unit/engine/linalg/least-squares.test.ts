import { expect, it } from 'vitest'
import { leastSquares } from '#shared/engine/linalg/least-squares'
import { dotProduct, norm, orthonormalise, removeComponents } from '#shared/engine/linalg/orthonormalise'
import { qrFactor, qrTransposeTimes } from '#shared/engine/linalg/qr'
import { seededNormal } from '../helpers/random'

it('fits a straight line (truth: normal equations by hand, y = 1, 3, 2, 5 at x = 0..3: slope 1.1, intercept 1.1)', () => {
  const { x, sumOfSquares, covariance } = leastSquares([1, 0, 1, 1, 1, 2, 1, 3], 4, 2, [1, 3, 2, 5])!
  expect(x[0]).toBeCloseTo(1.1, 14)
  expect(x[1]).toBeCloseTo(1.1, 14)
  expect(sumOfSquares).toBeCloseTo(2.7, 13)
  // (A^T A)^-1 = [[14, -6], [-6, 4]] / 20
  expect([...covariance].map(value => Number(value.toFixed(12)))).toEqual([0.7, -0.3, -0.3, 0.2])
})

it('leaves residuals orthogonal to every column', () => {
  const normal = seededNormal(8)
  const [rows, columns] = [20, 5]
  const a = Float64Array.from({ length: rows * columns }, normal)
  const { residuals } = leastSquares(a, rows, columns, Float64Array.from({ length: rows }, normal))!
  for (let j = 0; j < columns; j++) {
    let sum = 0
    for (let i = 0; i < rows; i++) sum += a[i * columns + j] * residuals[i]
    expect(Math.abs(sum)).toBeLessThan(1e-13)
  }
})

it('recovers the coefficients of a polynomial of degree 9 that normal equations would lose', () => {
  const rows = 21
  const a = Array.from({ length: rows * 10 }, (_, at) => (Math.floor(at / 10) / 20) ** (at % 10))
  const b = Array.from({ length: rows }, (_, i) => a.slice(i * 10, i * 10 + 10).reduce((x, y) => x + y))
  const { x } = leastSquares(a, rows, 10, b)!
  for (const coefficient of x) expect(Math.abs(coefficient - 1)).toBeLessThan(1e-7)
})

it('says so when columns depend on each other or rows are too few', () => {
  expect(leastSquares([1, 2, 2, 4, 3, 6], 3, 2, [1, 2, 3])).toBeNull()
  expect(leastSquares([1, 0, 1, 0], 2, 2, [1, 2])).toBeNull()
  expect(leastSquares([1, 2], 1, 2, [1])).toBeNull()
})

it('keeps lengths under Q^T', () => {
  const normal = seededNormal(2)
  const qr = qrFactor(Float64Array.from({ length: 24 }, normal), 8, 3)
  const b = Float64Array.from({ length: 8 }, normal)
  expect(qr.rank).toBe(3)
  expect(norm(qrTransposeTimes(qr, b))).toBeCloseTo(norm(b), 13)
})

it('builds an orthonormal basis and drops what is already spanned', () => {
  const normal = seededNormal(4)
  const a = Float64Array.from({ length: 7 }, normal)
  const b = Float64Array.from({ length: 7 }, normal)
  const basis = orthonormalise([a, b, a.map((value, i) => value - 2 * b[i])])
  expect(basis).toHaveLength(2)
  expect(dotProduct(basis[0], basis[1])).toBeCloseTo(0, 14)
  expect(norm(basis[1])).toBeCloseTo(1, 14)
  expect(norm(removeComponents(b, basis))).toBeLessThan(1e-14)
})
