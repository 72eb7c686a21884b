import { expect, it } from 'vitest'
import { qrFactor, qrTimes, qrTransposeTimes } from '#shared/engine/linalg/qr'
import { singularValues } from '#shared/engine/linalg/singular-values'
import { seededNormal } from '../helpers/random'

it('are those of a matrix worked by hand (truth: [[3, 0], [4, 5]] has 3 sqrt 5 and sqrt 5)', () => {
  const [first, second] = singularValues([3, 0, 4, 5], 2, 2)
  expect(first).toBeCloseTo(3 * Math.sqrt(5), 14)
  expect(second).toBeCloseTo(Math.sqrt(5), 14)
})

it('have the squares that sum to the squares of the entries, and the product of the determinant', () => {
  const a = Float64Array.from({ length: 9 }, seededNormal(6))
  const values = singularValues(a, 3, 3)
  expect(values.reduce((sum, value) => sum + value * value, 0)).toBeCloseTo(a.reduce((sum, value) => sum + value * value, 0), 12)
  const determinant = a[0] * (a[4] * a[8] - a[5] * a[7]) - a[1] * (a[3] * a[8] - a[5] * a[6]) + a[2] * (a[3] * a[7] - a[4] * a[6])
  expect(values.reduce((product, value) => product * value, 1)).toBeCloseTo(Math.abs(determinant), 12)
  expect([...values]).toEqual([...values].sort((p, q) => q - p))
})

it('keep small values: condition of the Hilbert matrix of order 6 (truth: 1.4951e7, Golub & Van Loan; exact digits from rational arithmetic are not needed)', () => {
  const hilbert = Array.from({ length: 36 }, (_, i) => 1 / (Math.floor(i / 6) + i % 6 + 1))
  const values = singularValues(hilbert, 6, 6)
  expect(values[0] / values[5]).toBeCloseTo(1.4951e7, -3)
})

it('are zero for dependent and for empty columns', () => {
  expect(singularValues([1, 2, 2, 4, 3, 6], 3, 2)[1]).toBeLessThan(1e-15)
  expect([...singularValues([0, 0, 0, 0], 2, 2)]).toEqual([0, 0])
  expect([...singularValues([], 0, 0)]).toEqual([])
})

it('do not change under the orthogonal factor of a QR, whose products undo each other', () => {
  const normal = seededNormal(15)
  const a = Float64Array.from({ length: 21 }, normal)
  const qr = qrFactor(a, 7, 3)
  const r = Float64Array.from({ length: 9 }, (_, i) => Math.floor(i / 3) <= i % 3 ? qr.packed[i] : 0)
  singularValues(a, 7, 3).forEach((value, i) => expect(singularValues(r, 3, 3)[i]).toBeCloseTo(value, 13))
  const b = Float64Array.from({ length: 7 }, normal)
  qrTimes(qr, qrTransposeTimes(qr, b)).forEach((value, i) => expect(value).toBeCloseTo(b[i], 14))
})
