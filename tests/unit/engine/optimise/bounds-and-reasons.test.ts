import { describe, expect, it } from 'vitest'
import { defaultOptions, defaultScalePart, resolveOptions } from '#shared/engine/optimise/defaults'
import { minimiseSquares } from '#shared/engine/optimise/minimise-squares'
import { isConverged, reasonWords } from '#shared/engine/optimise/messages'
import type { EndReason, LeastSquaresProblem } from '#shared/engine/optimise/types'
import typesSource from '../../../../shared/engine/optimise/types.ts?raw'
import { seededNormal } from '../helpers/random'
import { decay, knownProblems, problemFrom } from '../helpers/least-squares-problems'

const list = (values: ArrayLike<number>) => Array.from(values)

describe('bounds', () => {
  it('hold a parameter that would leave them and free it when it would not', () => {
    // |p - (3, 1)| inside the unit square of the first quadrant: (1, 1).
    const problem = problemFrom(2, ([p, q]) => [p - 3, q - 1])
    const fit = minimiseSquares(problem, [0.5, 0.5], { lower: [0, 0], upper: [1, 2], noise: 'absolute' })
    expect(fit.value[0]).toBe(1)
    expect(fit.value[1]).toBeCloseTo(1, 10)
    expect(fit.atBound).toEqual(['upper', null])
    expect(fit.converged).toBe(true)
    expect(list(fit.covariance!).slice(0, 3)).toEqual([0, 0, 0])
    expect(fit.covariance![3]).toBeCloseTo(1, 9)
    expect(fit.dof).toBe(1)
    const inside = minimiseSquares(problem, [0, 0], { lower: [0, 0], upper: [9, 9] })
    expect(inside.value[0]).toBeCloseTo(3, 10)
    expect(inside.atBound).toEqual([null, null])
  })

  it('are never left, not even by the steps of the differences', () => {
    const seen: number[][] = []
    const problem = problemFrom(3, ([p, q]) => {
      seen.push([p, q])
      return [p - 5, 2 * q + p, q - 1]
    })
    const fit = minimiseSquares(problem, [1, 1], { lower: [0.5, 0.25], upper: [2, 4] })
    expect(fit.atBound).toEqual(['upper', 'lower'])
    for (const [p, q] of seen) expect(p >= 0.5 && p <= 2 && q >= 0.25 && q <= 4).toBe(true)
  })

  it('keep a parameter whose two bounds are one', () => {
    const fit = minimiseSquares(decay(0.1), [5, 1], { lower: [4, 0], upper: [4, 9], noise: 'absolute' })
    expect(fit.value[0]).toBe(4)
    expect(fit.covariance![0]).toBe(0)
    expect(fit.covariance![3]).toBeGreaterThan(0)
    expect(fit.converged).toBe(true)
  })

  it('move a start that lies outside', () => {
    const fit = minimiseSquares(decay(), [100, 100], { lower: [0, 0], upper: [10, 2] })
    expect(fit.value[0]).toBeCloseTo(5, 9)
  })

  it('lead to a point that satisfies the conditions of Karush, Kuhn and Tucker in 100 random linear problems', () => {
    const normal = seededNormal(9)
    for (let draw = 0; draw < 100; draw++) {
      const [m, n] = [12, 4]
      const a = Array.from({ length: m * n }, normal)
      const b = Array.from({ length: m }, () => 3 * normal())
      const problem: LeastSquaresProblem = {
        residualCount: m,
        residuals: (p, r) => { for (let i = 0; i < m; i++) r[i] = p.reduce((sum, value, j) => sum + a[i * n + j] * value, 0) - b[i] },
        jacobian: (_, j) => j.set(a),
      }
      const fit = minimiseSquares(problem, [0.2, 0.2, 0.2, 0.2], { lower: [0, 0, 0, 0], upper: [0.4, 0.4, 0.4, 0.4] })
      expect(fit.converged, fit.message).toBe(true)
      for (let j = 0; j < n; j++) {
        const gradient = list(fit.residuals).reduce((sum, value, i) => sum + value * a[i * n + j], 0)
        const bound = fit.atBound[j]
        if (bound === 'lower') expect(fit.value[j] === 0 && gradient > 0).toBe(true)
        else if (bound === 'upper') expect(fit.value[j] === 0.4 && gradient < 0).toBe(true)
        else expect(Math.abs(gradient)).toBeLessThan(1e-9)
      }
    }
  })
})

describe('every end has its reason:', () => {
  const reasonOf = (problem: LeastSquaresProblem, start: number[], options = {}) => minimiseSquares(problem, start, options).reason

  it('exact for residuals that vanish', () => {
    expect(reasonOf(problemFrom(1, ([p]) => [p - 2]), [2])).toBe('exact')
  })

  it('offset for a start at the minimum', () => {
    expect(reasonOf(problemFrom(2, ([p]) => [p - 1, p + 1], () => [1, 1]), [0])).toBe('offset')
  })

  it('undetermined where two parameters do the same, and then no covariance', () => {
    const fit = minimiseSquares(problemFrom(3, ([p, q]) => [p + q - 1, 2 * (p + q) - 3, p + q]), [1, 2])
    expect(fit.reason).toBe('undetermined')
    expect(fit.covariance).toBeNull()
    expect(fit.rank).toBe(1)
    expect(fit.condition).toBe(Infinity)
    expect(fit.converged).toBe(false)
  })

  it('undetermined where the residuals do not depend on a parameter at all', () => {
    const fit = minimiseSquares(problemFrom(3, ([p]) => [p - 1, p - 2, 0.5]), [1, 7])
    expect(fit.reason).toBe('undetermined')
    expect(fit.value[0]).toBeCloseTo(1.5, 9)
    expect(fit.value[1]).toBe(7)
  })

  it('stalled where the derivatives do not belong to the residuals', () => {
    const fit = minimiseSquares(problemFrom(2, ([p]) => [p - 3, 1], () => [-1, 0]), [1])
    expect(fit.reason).toBe('stalled')
    expect(fit.value[0]).toBe(1)
    expect(fit.converged).toBe(false)
  })

  it('not-finite for a start where the model has no value, and for derivatives that have none', () => {
    expect(reasonOf(problemFrom(1, ([p]) => [Math.log(p)]), [-1])).toBe('not-finite')
    expect(reasonOf(problemFrom(1, ([p]) => [p - 1], () => [Number.NaN]), [0])).toBe('not-finite')
    let calls = 0
    const later = minimiseSquares(problemFrom(1, ([p]) => [p - 1], () => [++calls > 1 ? Infinity : 1]), [0])
    expect(later.reason).toBe('not-finite')
    expect(later.covariance).toBeNull()
  })

  it('in words for each of them', () => {
    for (const [reason, words] of Object.entries(reasonWords)) {
      expect(words, reason).toMatch(/^[A-Z].*\.$/)
      expect(isConverged(reason as EndReason)).toBe(['offset', 'step', 'reduction', 'rounding', 'exact'].includes(reason))
    }
  })
})

describe('wrong input is told in words and never thrown:', () => {
  const problem = decay()
  it.each([
    ['no parameter', [], {}, 'There is no parameter to fit.'],
    ['too many parameters', new Array(11).fill(1), {}, '10 residuals do not determine 11 parameters.'],
    ['a start that is not a number', [1, Number.NaN], {}, 'The start of parameter 2 is not a finite number.'],
    ['bounds of another length', [1, 1], { lower: [0] }, 'The bounds are not as many as the parameters.'],
    ['bounds the wrong way round', [1, 1], { lower: [0, 3], upper: [1, 2] }, 'The lower bound of parameter 2 is not below its upper bound.'],
    ['a scale that is negative', [1, 1], { scale: [1, -1] }, 'The scales are not one finite number of at least 0 for each parameter.'],
    ['a tolerance that is negative', [1, 1], { stepTolerance: -1 }, 'A tolerance is not between 0 and 1.'],
    ['a damping of zero', [1, 1], { damping: 0 }, 'The damping is not a positive number.'],
    ['half a step', [1, 1], { maxIterations: 2.5 }, 'A number of steps is not a whole number.'],
  ])('%s', (_, start, options, message) => {
    const fit = minimiseSquares(problem, start, options)
    expect([fit.reason, fit.message, fit.converged, fit.covariance]).toEqual(['invalid-input', message, false, null])
    expect(fit.atBound).toHaveLength(start.length)
  })

  it('a count of residuals that is none', () => {
    expect(minimiseSquares({ residualCount: -3, residuals: () => {} }, [1]).reason).toBe('invalid-input')
  })
})

describe('defaults', () => {
  it('are what the documentation of each option says', () => {
    const documented = Object.fromEntries([...typesSource.matchAll(/@defaultValue ([^*\n]+?)(?: \*\/|\n\s*\*\/)\s*\n\s*(\w+)\?:/g)].map(([, value, name]) => [name, value.trim()]))
    expect(Object.keys(documented).sort()).toEqual(['damping', 'lower', 'maxIterations', 'noise', 'offsetTolerance', 'polishSteps', 'reductionTolerance', 'scale', 'stepTolerance', 'stop', 'upper'])
    for (const [name, value] of Object.entries(defaultOptions)) {
      const said = documented[name]
      expect(typeof value === 'number' ? Number(said) : said, name).toBe(typeof value === 'number' ? value : `'${value}'`)
    }
    expect(documented.lower).toBe('none')
    expect(documented.upper).toBe('none')
    expect(documented.stop).toBe('never')
    expect(documented.scale).toBe('1e-4 of |start|')
    expect(defaultScalePart).toBe(1e-4)
  })

  it('are used: an option that is undefined is the default, one that is given is not', () => {
    const resolved = resolveOptions({ damping: undefined, maxIterations: 7 }, [2])
    expect(resolved.damping).toBe(defaultOptions.damping)
    expect(resolved.maxIterations).toBe(7)
    expect(resolved.stop()).toBe(false)
    expect([list(resolved.lower), list(resolved.upper), list(resolved.scale)]).toEqual([[-Infinity], [Infinity], [2e-4]])
    // 1000 steps at most: a valley without end.
    const endless = problemFrom(1, ([p]) => [Math.exp(-p / 1e4) + 1])
    expect(minimiseSquares(endless, [1]).iterations).toBeLessThanOrEqual(1000)
  })

  it('of the scale let a parameter start at zero', () => {
    const { problem } = knownProblems[0]
    const fit = minimiseSquares(problem, [0, 0])
    expect(fit.value[0]).toBeCloseTo(1, 9)
    const scaled = minimiseSquares(problem, [0, 0], { scale: [1, 1] })
    expect(scaled.value[1]).toBeCloseTo(1, 9)
  })
})
