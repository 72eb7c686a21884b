import { describe, expect, it } from 'vitest'
import { leastSquares } from '#shared/engine/linalg/least-squares'
import { minimiseSquares } from '#shared/engine/optimise/minimise-squares'
import type { LeastSquaresProblem } from '#shared/engine/optimise/types'
import { seededNormal, seededRandom } from '../helpers/random'
import { decay, knownProblems, problemFrom } from '../helpers/least-squares-problems'

const list = (values: ArrayLike<number>) => Array.from(values)

describe('minimiseSquares finds the published minimum of', () => {
  it.each(knownProblems)('$name', ({ problem, start, minimum, sumOfSquares }) => {
    const fit = minimiseSquares(problem, start)
    // As many residuals as parameters and yet not zero: their slopes must be dependent there.
    expect(fit.converged || (fit.reason === 'undetermined' && sumOfSquares > 0 && problem.residualCount === start.length), fit.message).toBe(true)
    minimum.forEach((value, j) => expect(Math.abs(fit.value[j] - value)).toBeLessThan(2e-8 * Math.max(1, Math.abs(value))))
    expect(Math.abs(fit.sumOfSquares - sumOfSquares)).toBeLessThan(1e-9 * Math.max(1, sumOfSquares))
  })

  it.each(knownProblems)('$name also from starts ten times farther, or says that it did not', ({ problem, start, sumOfSquares }) => {
    const fit = minimiseSquares(problem, start.map(value => 10 * value))
    const reached = fit.sumOfSquares <= sumOfSquares * (1 + 1e-6) + 1e-9
    // Bard has further stationary points at infinity; nothing but a minimum may be called one.
    if (fit.converged && !reached) expect(fit.offset).toBeLessThan(1e-6)
    else expect(reached || !fit.converged).toBe(true)
  })
})

describe('a linear problem', () => {
  const normal = seededNormal(31)
  const [m, n] = [25, 4]
  const a = Float64Array.from({ length: m * n }, normal)
  const b = Float64Array.from({ length: m }, normal)
  const linear: LeastSquaresProblem = {
    residualCount: m,
    residuals: (p, r) => { for (let i = 0; i < m; i++) r[i] = p.reduce((sum, value, j) => sum + a[i * n + j] * value, 0) - b[i] },
    jacobian: (_, j) => j.set(a),
  }
  const truth = leastSquares(a, m, n, b)!

  it('has the solution and covariance of linear least squares', () => {
    const fit = minimiseSquares(linear, [1, 1, 1, 1], { noise: 'absolute' })
    list(truth.x).forEach((value, j) => expect(fit.value[j]).toBeCloseTo(value, 13))
    list(truth.covariance).forEach((value, i) => expect(fit.covariance![i]).toBeCloseTo(value, 13))
    expect(fit.sumOfSquares).toBeCloseTo(truth.sumOfSquares, 12)
    expect(fit.dof).toBe(21)
    expect(fit.rank).toBe(4)
  })

  it('scales the covariance by the sum of squares over the degrees of freedom by default', () => {
    const absolute = minimiseSquares(linear, [0, 0, 0, 0], { noise: 'absolute' })
    const relative = minimiseSquares(linear, [0, 0, 0, 0])
    list(absolute.covariance!).forEach((value, i) => expect(relative.covariance![i]).toBeCloseTo(value * truth.sumOfSquares / 21, 13))
  })

  it('has no scaled covariance without degrees of freedom, yet an absolute one', () => {
    const square = problemFrom(2, ([p, q]) => [p + q - 3, p - q - 1])
    expect(minimiseSquares(square, [0.1, 0.1]).covariance).toBeNull()
    const { covariance, value } = minimiseSquares(square, [0.1, 0.1], { noise: 'absolute' })
    expect(value[0]).toBeCloseTo(2, 12)
    const truth = [0.5, 0, 0, 0.5]
    truth.forEach((entry, i) => expect(covariance![i]).toBeCloseTo(entry, 9))
  })
})

describe('descent', () => {
  it.each(knownProblems)('of $name never becomes worse from one step to the next', ({ problem, start }) => {
    let last = Infinity
    for (let steps = 0; steps <= 40; steps++) {
      const { sumOfSquares } = minimiseSquares(problem, start, { maxIterations: steps, polishSteps: 0 })
      expect(sumOfSquares).toBeLessThanOrEqual(last)
      last = sumOfSquares
    }
  })

  it('gives the best point so far when it is stopped or runs out of steps', () => {
    const { problem, start } = knownProblems[0]
    let asked = 0
    const stopped = minimiseSquares(problem, start, { stop: () => ++asked > 5 })
    expect(stopped.reason).toBe('stopped')
    expect(stopped.iterations).toBe(5)
    expect(stopped.converged).toBe(false)
    const limited = minimiseSquares(problem, start, { maxIterations: 5 })
    expect(limited.reason).toBe('iteration-limit')
    expect(list(limited.value)).toEqual(list(stopped.value))
    expect(limited.sumOfSquares).toBeLessThan(24.2)
  })

  it('goes round places where the model cannot be evaluated', () => {
    // ln p has no value below zero; a Gauss-Newton step from 8 would lead there.
    const fit = minimiseSquares(problemFrom(1, ([p]) => [Math.log(p) - 0.5]), [8])
    expect(fit.converged).toBe(true)
    expect(fit.value[0]).toBeCloseTo(Math.exp(0.5), 12)
  })

  it('polishes away the half of the digits that the sum of squares does not show', () => {
    const problem = decay(0.3)
    const rough = minimiseSquares(problem, [1, 1], { polishSteps: 0, reductionTolerance: 1e-6, stepTolerance: 0, offsetTolerance: 0 })
    const fine = minimiseSquares(problem, [1, 1], { reductionTolerance: 1e-6, stepTolerance: 0, offsetTolerance: 0 })
    expect(rough.offset).toBeGreaterThan(1e-8)
    expect(fine.offset).toBeLessThan(1e-14)
  })
})

describe('units and order do not matter:', () => {
  const base = minimiseSquares(decay(0.2), [1, 2])

  it.each([1e-9, 1e9])('parameters in units of %f', (unit) => {
    const plain = decay(0.2)
    const problem: LeastSquaresProblem = { residualCount: 10, residuals: (p, r) => plain.residuals(Float64Array.of(p[0] / unit, p[1] * unit), r) }
    const fit = minimiseSquares(problem, [unit, 2 / unit])
    expect(fit.value[0] / unit).toBeCloseTo(base.value[0], 8)
    expect(fit.value[1] * unit).toBeCloseTo(base.value[1], 8)
    expect(Math.sqrt(fit.covariance![0]) / unit).toBeCloseTo(Math.sqrt(base.covariance![0]), 8)
    expect(fit.condition).toBeCloseTo(base.condition, 6)
  })

  it.each([1e-9, 1e9])('residuals in units of %f', (unit) => {
    const plain = decay(0.2)
    const problem: LeastSquaresProblem = {
      residualCount: 10,
      residuals: (p, r) => { plain.residuals(p, r); for (let i = 0; i < 10; i++) r[i] *= unit },
      jacobian: (p, j) => { plain.jacobian!(p, j); for (let i = 0; i < 20; i++) j[i] *= unit },
    }
    const fit = minimiseSquares(problem, [1, 2])
    list(base.value).forEach((value, j) => expect(fit.value[j]).toBeCloseTo(value, 11))
    list(base.covariance!).forEach((value, i) => expect(fit.covariance![i]).toBeCloseTo(value, 11))
  })

  it('residuals and parameters in another order', () => {
    const plain = decay(0.2)
    const problem: LeastSquaresProblem = { residualCount: 10, residuals: (p, r) => { plain.residuals(Float64Array.of(p[1], p[0]), r); r.reverse() } }
    const fit = minimiseSquares(problem, [2, 1])
    expect(fit.value[1]).toBeCloseTo(base.value[0], 9)
    expect(fit.covariance![3]).toBeCloseTo(base.covariance![0], 9)
  })

  it('derivatives given or taken by differences', () => {
    const { residuals } = decay(0.2)
    const fit = minimiseSquares({ residualCount: 10, residuals }, [1, 2])
    list(base.value).forEach((value, j) => expect(fit.value[j]).toBeCloseTo(value, 10))
    list(base.covariance!).forEach((value, i) => expect(fit.covariance![i]).toBeCloseTo(value, 9))
    expect(fit.evaluations).toBeGreaterThan(fit.iterations + 1)
  })
})

describe('known parameters come back', () => {
  it('from 200 noise-free tables and starts up to a factor of three away', () => {
    const random = seededRandom(12)
    for (let draw = 0; draw < 200; draw++) {
      const truth = [1 + 9 * random(), 0.2 + random(), 2 * random() - 1]
      const x = Array.from({ length: 12 }, (_, i) => i / 3)
      const y = x.map(at => truth[0] * Math.exp(-truth[1] * at) + truth[2])
      const fit = minimiseSquares(problemFrom(12, ([a, b, c]) => x.map((at, i) => a * Math.exp(-b * at) + c - y[i])), [truth[0] * 3 ** (2 * random() - 1), truth[1] * 3 ** (2 * random() - 1), random()])
      expect(fit.converged, fit.message).toBe(true)
      truth.forEach((value, j) => expect(Math.abs(fit.value[j] - value)).toBeLessThan(1e-9))
    }
  })

  it('with errors that the covariance foretells: mean of chi2 of 1000 noisy fits is the number of parameters', () => {
    const normal = seededNormal(44)
    const x = Array.from({ length: 15 }, (_, i) => i / 4)
    let sum = 0
    for (let draw = 0; draw < 1000; draw++) {
      const y = x.map(at => 5 * Math.exp(-0.6 * at) + 0.02 * normal())
      const { value, covariance } = minimiseSquares(problemFrom(15, ([a, b]) => x.map((at, i) => (a * Math.exp(-b * at) - y[i]) / 0.02), ([a, b]) => x.flatMap(at => [Math.exp(-b * at) / 0.02, -a * at * Math.exp(-b * at) / 0.02])), [4, 1], { noise: 'absolute' })
      const [aa, ab, , bb] = list(covariance!)
      const [da, db] = [value[0] - 5, value[1] - 0.6]
      sum += (da * da * bb - 2 * da * db * ab + db * db * aa) / (aa * bb - ab * ab)
    }
    // chi2 with 2 degrees of freedom: mean 2, standard deviation 2.
    expect(Math.abs(sum / 1000 - 2)).toBeLessThan(4 * 2 / Math.sqrt(1000))
  })
})
