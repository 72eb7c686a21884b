import { expect, it } from 'vitest'
import { nonNegativeScales } from '#shared/engine/envelope/non-negative-scales'
import { seededNormal } from '../helpers/random'

/** A random least-squares problem of n non-negative unknowns: M = G^T G, v = G^T y. */
function problem(n: number, seed: number) {
  const normal = seededNormal(seed)
  const rows = n + 4
  const g = Array.from({ length: rows }, () => Array.from({ length: n }, () => Math.abs(normal())))
  const y = Array.from({ length: rows }, normal)
  const normalMatrix = Float64Array.from({ length: n * n }, (_, at) => g.reduce((sum, row) => sum + row[Math.floor(at / n)] * row[at % n], 0))
  return { normal: normalMatrix, right: Array.from({ length: n }, (_, j) => g.reduce((sum, row, i) => sum + row[j] * y[i], 0)) }
}

it('meets the Kuhn-Tucker conditions: no negative scale, no descent left', () => {
  for (let seed = 1; seed <= 300; seed++) {
    const n = 1 + seed % 5
    const { normal, right } = problem(n, seed)
    const scales = new Float64Array(n)
    const active = nonNegativeScales(normal, right, scales)
    for (let a = 0; a < n; a++) {
      let gradient = -right[a]
      for (let b = 0; b < n; b++) gradient += normal[a * n + b] * scales[b]
      expect(scales[a]).toBeGreaterThanOrEqual(0)
      if (active.includes(a)) expect(Math.abs(gradient)).toBeLessThan(1e-9)
      else expect(gradient).toBeGreaterThan(-1e-9)
    }
  }
})

it('gives zeros when every right side is negative', () => {
  const scales = new Float64Array(2)
  expect(nonNegativeScales(Float64Array.of(2, 1, 1, 2), [-1, -3], scales)).toEqual([])
  expect([...scales]).toEqual([0, 0])
})
