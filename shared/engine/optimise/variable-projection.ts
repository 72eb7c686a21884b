import { resolveOptions } from './defaults'
import type { ResolvedOptions } from './defaults'
import { differenceResolution } from './differences'
import { fullProblem } from './full-problem'
import { linearise } from './linearisation'
import { minimiseSquares } from './minimise-squares'
import { Evaluator } from './point'
import { polish } from './polish'
import { Projection } from './projection'
import type { ProjectionForm } from './projection'
import { resultAt } from './result'
import type { SeparableProblem, SeparableResult } from './separable'
import type { LeastSquaresOptions, LeastSquaresResult } from './types'

/**
 * Least squares for a model that is linear in some parameters: those are solved for exactly (by QR) at every point, and only the
 * others are searched for (Golub & Pereyra 1973). Starts are needed for these alone, and fewer of them lead astray.
 *
 * @param start alpha, length q, in the caller's units
 * @param options as of `minimiseSquares`; bounds and scales are those of alpha. `form`: the derivative used on the way,
 * `kaufman` (default, cheaper) or `golub-pereyra`
 * @returns parameters alpha then c; covariance of both together. Nothing is thrown
 * @example
 * // y = 3 exp(-x / 2) at x = 0, 1, 2, 3
 * const data = [0, 1, 2, 3].map(x => 3 * Math.exp(-x / 2))
 * const columns = ([rate], out) => { for (let i = 0; i < 4; i++) out[i] = Math.exp(-rate * i) }
 * const fit = minimiseSeparable({ data, linearCount: 1, columns }, [2])
 * Number(fit.nonlinear[0].toFixed(9)) // => 0.5
 * Number(fit.linear[0].toFixed(9)) // => 3
 */
export function minimiseSeparable(problem: SeparableProblem, start: ArrayLike<number>, options: LeastSquaresOptions & { form?: ProjectionForm } = {}): SeparableResult {
  const { form, ...rest } = options
  const { data, linearCount: p } = problem
  const resolved = resolveOptions(rest, start)
  const shapes = Number.isInteger(p) && p > 0 && resolved.lower.length === start.length
  if (!shapes || data.length < start.length + p) return failed(minimiseSquares({ residualCount: 0, residuals: () => {} }, start, rest), p)
  const projection = new Projection(problem, resolved, form)
  const search = minimiseSquares({
    residualCount: data.length,
    residuals: (alpha, out) => projection.residuals(alpha, out),
    jacobian: (alpha, out) => projection.jacobian(alpha, out),
  }, start, { ...rest, polishSteps: 0 })
  if (search.reason === 'invalid-input' || search.reason === 'not-finite') return failed(search, p)
  projection.residuals(search.value, new Float64Array(data.length))
  return inAllParameters(problem, search, projection.linear, rest, resolved)
}

/** Covariance, and the last steps, belong to all parameters at once: with c eliminated the rounding of c is not seen. */
function inAllParameters(problem: SeparableProblem, search: LeastSquaresResult, c: Float64Array, given: LeastSquaresOptions, reduced: ResolvedOptions): SeparableResult {
  const p = c.length
  const q = search.value.length
  const parameters = Float64Array.of(...search.value, ...c)
  const options = resolveOptions({ ...given, scale: undefined, lower: padded(reduced.lower, p, -Infinity), upper: padded(reduced.upper, p, Infinity) }, parameters)
  const evaluator = new Evaluator(fullProblem(problem, reduced), options, problem.derivatives ? undefined : differenceResolution)
  const point = evaluator.at(parameters)
  const jacobian = new Float64Array(point.residuals.length * (q + p))
  evaluator.jacobian(point, jacobian)
  const end = { point, linear: linearise(point, jacobian, options, evaluator.resolution), reason: search.reason, iterations: search.iterations }
  const result = resultAt(search.converged ? polish(evaluator, end, jacobian, options) : end, search.evaluations + evaluator.evaluations, options)
  return { ...result, nonlinear: result.value.slice(0, q), linear: result.value.slice(q) }
}

function padded(bounds: Float64Array, p: number, value: number): Float64Array {
  return Float64Array.of(...bounds, ...new Array<number>(p).fill(value))
}

function failed(search: LeastSquaresResult, p: number): SeparableResult {
  return { ...search, covariance: null, nonlinear: search.value, linear: new Float64Array(Math.max(0, p | 0)) }
}
