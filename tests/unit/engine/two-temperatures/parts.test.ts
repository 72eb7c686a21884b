import { describe, expect, it } from 'vitest'
import { cholesky } from '#shared/engine/linalg/cholesky'
import { CoupledBands } from '#shared/engine/two-temperatures/coupled-bands'
import { fitPair, pairDescentFor, searchPair } from '#shared/engine/two-temperatures/fit-pair'
import { correctedAkaike } from '#shared/engine/two-temperatures/information'
import { PairGrid } from '#shared/engine/two-temperatures/pair-grid'
import { PairModel } from '#shared/engine/two-temperatures/pair-model'
import { improvement } from '#shared/engine/two-temperatures/bootstrap'
import { runToEnd } from '#shared/engine/two-temperatures/run-to-end'
import { SeparateBands } from '#shared/engine/two-temperatures/separate-bands'
import type { EnvelopeProblem } from '#shared/engine/envelope/problem'
import { neighbourCovariance, problemOf } from '../helpers/problems'
import { seededNormal } from '../helpers/random'
import { nameOf, readings, rotorLines } from '../helpers/tables'
import { twoGases } from '../helpers/two-gases'

const list = (values: ArrayLike<number>) => Array.from(values)
const banded = (bands: number, count = 18) => rotorLines(count, 1.93).map((line, i) => ({ ...line, band: `band ${i % bands}` }))
const noisy = (bands: number, seed: number, share = 0.5) => twoGases({ lines: banded(bands), share, noise: 0.01, normal: seededNormal(seed) })

describe.each(readings.filter(reading => reading.backgroundTemperature !== 2.725).map(reading => [nameOf(reading), reading] as const))('two gases of %s', (_, reading) => {
  const input = twoGases({ reading, lines: banded(2), normal: seededNormal(4) })
  const model = new PairModel(problemOf(input))
  const p = Float64Array.of(1 / 30, 1 / 200, 1.5, 0.7, 0.4, 0.9)

  it('have derivatives that differences confirm', () => {
    const { residualCount: m, residuals, jacobian } = model.leastSquares(model.problem.intensity)
    const analytic = new Float64Array(m * 6)
    jacobian!(p, analytic)
    for (let j = 0; j < 6; j++) {
      const h = 1e-6 * p[j]
      const [up, down] = [h, -h].map((step) => {
        const r = new Float64Array(m)
        residuals(p.map((value, k) => k === j ? value + step : value), r)
        return r
      })
      for (let i = 0; i < m; i++) expect(Math.abs(analytic[i * 6 + j] - (up[i] - down[i]) / (2 * h))).toBeLessThan(1e-6 * (1 + Math.abs(analytic[i * 6 + j]) + Math.abs(up[i] / p[j])))
    }
  })

  it('add up to the data less the residuals', () => {
    const r = new Float64Array(18)
    model.leastSquares(model.problem.intensity).residuals(p, r)
    const [cold, hot] = model.intensities(p)
    r.forEach((value, i) => expect(value).toBeCloseTo((model.problem.intensity[i] - cold[i] - hot[i]) * model.problem.inverseSigma[i], 8))
  })
})

describe('the descent with the scales eliminated', () => {
  const descents: [string, EnvelopeProblem][] = [1, 2, 3].flatMap((bands) => {
    const input = noisy(bands, 11 + bands)
    return [[`${bands} bands`, problemOf(input)], [`${bands} bands with covariance`, problemOf(input, { covariance: neighbourCovariance(input, 0.4) })]]
  })

  it.each(descents)('of %s ends where the least squares in all parameters end', (_, problem) => {
    const model = new PairModel(problem)
    const grid = new PairGrid(model)
    const whitened = model.whiten(Float64Array.from(problem.intensity))
    const found = runToEnd(searchPair(grid, pairDescentFor(problem), whitened))!
    const full = runToEnd(fitPair(model, grid))!
    expect(full.converged, full.message).toBe(true)
    expect(found.chi2 / full.sumOfSquares - 1).toBeGreaterThan(-1e-12)
    expect(found.chi2 / full.sumOfSquares - 1).toBeLessThan(1e-6)
    list(full.value).forEach((value, j) => expect(Math.abs(found.parameters[j] / value - 1)).toBeLessThan(1e-2))
  })

  it.each(descents)('of %s leaves the residuals orthogonal to the columns in use and no scale negative', (_, problem) => {
    const model = new PairModel(problem)
    const whitened = model.whiten(Float64Array.from(problem.intensity))
    const descent = pairDescentFor(problem)
    descent.descend(whitened, [1 / 20, 1 / 300])
    const p = descent.parameters()
    const { jacobian, residuals, residualCount: m } = model.leastSquares(problem.intensity)
    const [r, j] = [new Float64Array(m), new Float64Array(m * p.length)]
    residuals(p, r)
    jacobian!(p, j)
    for (let k = 2; k < p.length; k++) {
      const [product, length] = list(r).reduce(([a, b], value, i) => [a + value * j[i * p.length + k], b + j[i * p.length + k] ** 2], [0, 0])
      expect(p[k]).toBeGreaterThanOrEqual(0)
      if (p[k] > 0) expect(Math.abs(product)).toBeLessThan(1e-7 * Math.sqrt(length * descent.chi2))
      else expect(product).toBeGreaterThan(-1e-7 * Math.sqrt(length * descent.chi2))
    }
  })

  it('is the same whether bands are solved apart or together', () => {
    const input = noisy(3, 5)
    const factor = cholesky(neighbourCovariance(input, 0), 18)!
    const [apart, together] = [new SeparateBands(problemOf(input)), new CoupledBands({ ...problemOf(input), factor })]
    const whitened = new PairModel(problemOf(input)).whiten(Float64Array.from(problemOf(input).intensity))
    for (const start of [[1 / 20, 1 / 300], [1 / 60, 1 / 90]] as const) {
      expect(together.descend(whitened, start) / apart.descend(whitened, start)).toBeCloseTo(1, 9)
      list(apart.parameters()).forEach((value, j) => expect(together.parameters()[j]).toBeCloseTo(value, 6))
    }
  })

  it('never ends above its start, from 100 starts', () => {
    const problem = problemOf(noisy(1, 8))
    const model = new PairModel(problem)
    const whitened = model.whiten(Float64Array.from(problem.intensity))
    const grid = new PairGrid(model)
    for (const { chi2, parameters } of grid.starts(whitened, 100)) expect(pairDescentFor(problem).descend(whitened, [parameters[0], parameters[1]])).toBeLessThanOrEqual(chi2 * (1 + 1e-12))
  })

  it('stays in the search range', () => {
    const problem: EnvelopeProblem = { ...problemOf(noisy(1, 3)), betaRange: [1 / 120, 1 / 40] }
    const model = new PairModel(problem)
    const { parameters } = runToEnd(searchPair(new PairGrid(model), pairDescentFor(problem), model.whiten(Float64Array.from(problem.intensity))))!
    for (const beta of parameters.subarray(0, 2)) expect(beta >= 1 / 120 * (1 - 1e-12) && beta <= 1 / 40 * (1 + 1e-12)).toBe(true)
  })
})

describe('the grid of pairs', () => {
  it.each([1, 3])('tells chi2 as the residuals do, %i bands', (bands) => {
    for (const covariance of [undefined, neighbourCovariance(noisy(bands, 2), 0.3)]) {
      const problem = problemOf(noisy(bands, 2), { covariance })
      const model = new PairModel(problem)
      const starts = new PairGrid(model).starts(model.whiten(Float64Array.from(problem.intensity)), 10)
      expect(starts.length).toBeGreaterThan(0)
      for (const { chi2, parameters } of starts) {
        const r = new Float64Array(18)
        model.leastSquares(problem.intensity).residuals(parameters, r)
        expect(list(r).reduce((sum, value) => sum + value * value, 0) / chi2).toBeCloseTo(1, 6)
        expect(parameters[0]).toBeGreaterThan(parameters[1])
      }
      expect(starts.map(start => start.chi2)).toEqual(starts.map(start => start.chi2).sort((a, b) => a - b))
    }
  })

  it('becomes coarser where the scales of many bands are coupled', () => {
    const size = (bands: number) => new PairGrid(new PairModel(problemOf(noisy(bands, 2), { covariance: neighbourCovariance(noisy(bands, 2), 0.3) }))).betas.length
    expect(size(1)).toBe(42)
    expect(size(6)).toBeLessThan(size(1))
    expect(size(18)).toBeGreaterThanOrEqual(3)
  })
})

describe('measures of improvement', () => {
  it('are a difference where the noise is known, a ratio where it is not, and never negative', () => {
    expect(improvement(10, 4, 'difference')).toBe(6)
    expect(improvement(10, 4, 'ratio')).toBe(1.5)
    expect(improvement(4, 10, 'difference')).toBe(0)
    expect(improvement(0, 0, 'ratio')).toBe(0)
  })

  it('by AICc begin at eight lines and end where the correction has no value (truth: formula of Hurvich & Tsai 1989 by hand)', () => {
    expect(correctedAkaike(7, 8, 4, true)).toBeCloseTo(7 + 8 + 40 / 3, 12)
    expect(correctedAkaike(7, 9, 2, false)).toBeCloseTo(9 * Math.log(7 / 9) + 6 + 24 / 5, 12)
    expect(correctedAkaike(7, 7, 2, true)).toBeNull()
    expect(correctedAkaike(7, 9, 8, true)).toBeNull()
    expect(correctedAkaike(0, 9, 2, false)).toBeNull()
  })
})
