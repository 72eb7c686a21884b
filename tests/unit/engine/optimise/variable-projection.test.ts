import { describe, expect, it } from 'vitest'
import { resolveOptions } from '#shared/engine/optimise/defaults'
import { minimiseSquares } from '#shared/engine/optimise/minimise-squares'
import { Projection } from '#shared/engine/optimise/projection'
import type { SeparableProblem } from '#shared/engine/optimise/separable'
import { minimiseSeparable } from '#shared/engine/optimise/variable-projection'
import { seededNormal } from '../helpers/random'

const list = (values: ArrayLike<number>) => Array.from(values)
const normal = seededNormal(77)
const x = Array.from({ length: 30 }, (_, i) => i / 6)
const m = x.length

/** Two exponentials on a constant. */
function twoDecays(noise: number, withDerivatives = true): SeparableProblem {
  const data = x.map(at => 4 * Math.exp(-0.4 * at) + 3 * Math.exp(-2 * at) + 0.5 + noise * normal())
  return {
    data,
    linearCount: 3,
    columns: ([a, b], out) => x.forEach((at, i) => out.set([Math.exp(-a * at), Math.exp(-b * at), 1], 3 * i)),
    ...(withDerivatives ? { derivatives: ([a, b]: Float64Array, out: Float64Array) => x.forEach((at, i) => out.set([-at * Math.exp(-a * at), 0, 0, -at * Math.exp(-b * at), 0, 0], 6 * i)) } : {}),
  }
}

/** The same problem with all five parameters searched for. */
const allAtOnce = ({ data, columns }: SeparableProblem) => ({
  residualCount: m,
  residuals: (p: Float64Array, r: Float64Array) => {
    const phi = new Float64Array(3 * m)
    columns(p.subarray(0, 2), phi)
    for (let i = 0; i < m; i++) r[i] = p[2] * phi[3 * i] + p[3] * phi[3 * i + 1] + p[4] * phi[3 * i + 2] - data[i]
  },
})

describe('variable projection', () => {
  it('finds the parameters of noise-free data from a start for the rates alone', () => {
    const fit = minimiseSeparable(twoDecays(0), [0.1, 5])
    expect(fit.converged, fit.message).toBe(true)
    ;[0.4, 2].forEach((rate, j) => expect(fit.nonlinear[j]).toBeCloseTo(rate, 9))
    ;[4, 3, 0.5].forEach((value, k) => expect(fit.linear[k]).toBeCloseTo(value, 9))
    expect(list(fit.value)).toEqual([...list(fit.nonlinear), ...list(fit.linear)])
  })

  it('gives the minimum, covariance and degrees of freedom of the search in all parameters', () => {
    const problem = twoDecays(0.05)
    const projected = minimiseSeparable(problem, [0.1, 5])
    const full = minimiseSquares(allAtOnce(problem), [0.5, 2.5, 3, 3, 1])
    expect(projected.dof).toBe(25)
    expect(projected.sumOfSquares).toBeCloseTo(full.sumOfSquares, 11)
    list(full.value).forEach((value, j) => expect(Math.abs(projected.value[j] / value - 1)).toBeLessThan(1e-7))
    list(full.covariance!).forEach((value, i) => expect(Math.abs(projected.covariance![i] - value)).toBeLessThan(1e-6 * Math.sqrt(full.covariance![6 * Math.floor(i / 5)] * full.covariance![6 * (i % 5)])))
    expect(projected.condition / full.condition).toBeCloseTo(1, 4)
  })

  it('is the same with both forms of the derivative and with differences', () => {
    const problem = twoDecays(0.05)
    const kaufman = minimiseSeparable(problem, [0.3, 3])
    for (const other of [minimiseSeparable(problem, [0.3, 3], { form: 'golub-pereyra' }), minimiseSeparable({ ...problem, derivatives: undefined }, [0.3, 3])]) {
      expect(other.converged).toBe(true)
      list(kaufman.value).forEach((value, j) => expect(Math.abs(other.value[j] / value - 1)).toBeLessThan(1e-7))
    }
  })

  it('holds bounds of the nonlinear parameters and leaves the linear ones free', () => {
    const fit = minimiseSeparable(twoDecays(0.05), [0.5, 2], { lower: [0.6, 0], upper: [9, 9], noise: 'absolute' })
    expect(fit.nonlinear[0]).toBe(0.6)
    expect(fit.atBound).toEqual(['lower', null, null, null, null])
    expect(fit.covariance![0]).toBe(0)
    expect(fit.covariance![6]).toBeGreaterThan(0)
  })

  it('does not accept rates that fall together, and refuses to start there', () => {
    expect(minimiseSeparable(twoDecays(0), [1, 1]).reason).toBe('not-finite')
    const data = x.map(at => Math.exp(-at) + 0.5)
    const single = minimiseSeparable({ ...twoDecays(0), data }, [0.5, 3])
    expect(single.nonlinear.every(Number.isFinite)).toBe(true)
    expect(single.sumOfSquares).toBeLessThan(1e-8)
  })

  it('says what is wrong with its input', () => {
    const problem = twoDecays(0)
    expect(minimiseSeparable(problem, []).reason).toBe('invalid-input')
    expect(minimiseSeparable({ ...problem, linearCount: 0 }, [1, 2]).reason).toBe('invalid-input')
    expect(minimiseSeparable({ ...problem, data: [1, 2, 3, 4] }, [1, 2]).reason).toBe('invalid-input')
    expect(minimiseSeparable(problem, [1, 2], { lower: [0] }).reason).toBe('invalid-input')
    expect(minimiseSeparable(problem, [1, Number.NaN]).converged).toBe(false)
  })
})

describe('the projected Jacobian', () => {
  const problem = twoDecays(0.5)
  const alpha = Float64Array.of(0.6, 1.5)
  const options = resolveOptions({}, alpha)

  /** Central differences of the projected residuals. */
  function byDifferences(): Float64Array {
    const projection = new Projection(problem, options)
    const out = new Float64Array(2 * m)
    for (const j of [0, 1]) {
      const h = 1e-5
      const [up, down] = [1, -1].map((sign) => {
        const r = new Float64Array(m)
        projection.residuals(alpha.map((value, k) => k === j ? value + sign * h : value), r)
        return r
      })
      for (let i = 0; i < m; i++) out[2 * i + j] = (up[i] - down[i]) / (2 * h)
    }
    return out
  }

  it('of Golub and Pereyra is the derivative of the residuals', () => {
    const out = new Float64Array(2 * m)
    new Projection(problem, options, 'golub-pereyra').jacobian(alpha, out)
    byDifferences().forEach((value, i) => expect(out[i]).toBeCloseTo(value, 7))
  })

  it('of Kaufman has the same gradient, though not the same entries', () => {
    const projection = new Projection(problem, options, 'kaufman')
    const out = new Float64Array(2 * m)
    const r = new Float64Array(m)
    projection.jacobian(alpha, out)
    projection.residuals(alpha, r)
    const exact = byDifferences()
    for (const j of [0, 1]) {
      const gradient = (jacobian: Float64Array) => r.reduce((sum, value, i) => sum + value * jacobian[2 * i + j], 0)
      expect(gradient(out)).toBeCloseTo(gradient(exact), 6)
    }
    expect(Math.max(...out.map((value, i) => Math.abs(value - exact[i])))).toBeGreaterThan(1e-4)
  })

  it('is orthogonal to the columns in the form of Kaufman', () => {
    const phi = new Float64Array(3 * m)
    problem.columns(alpha, phi)
    const out = new Float64Array(2 * m)
    new Projection(problem, options).jacobian(alpha, out)
    for (const j of [0, 1]) for (const k of [0, 1, 2]) expect(Math.abs(x.reduce((sum, _, i) => sum + out[2 * i + j] * phi[3 * i + k], 0))).toBeLessThan(1e-12)
  })
})
