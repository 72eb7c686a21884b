import { inputProblem, resolveOptions } from './defaults'
import { descend } from './descend'
import { isConverged } from './messages'
import { Evaluator } from './point'
import { polish } from './polish'
import { refused, resultAt } from './result'
import type { LeastSquaresOptions, LeastSquaresProblem, LeastSquaresResult } from './types'

/**
 * Nonlinear least squares by Levenberg-Marquardt with bounds, ended by undamped Gauss-Newton steps.
 *
 * Method: Moré 1978 (Lecture Notes in Mathematics 630, 105) in its scaling and its QR, damping of Nielsen 1999, bounds by holding
 * parameters that would leave them. Local: it finds the minimum that its start leads to.
 * Accuracy: 8 or more digits of every certified parameter and standard deviation of the NIST StRD collection (tests/truth/nist-strd).
 *
 * @param problem residuals (dimensionless when divided by their uncertainties) and, if known, their derivatives
 * @param start n parameters in the caller's units; moved into the bounds if outside
 * @returns always a result; `reason` and `message` say how the fit ended. Nothing is thrown
 * @example
 * // The closest approach of the curve y = x^2 to the point (3, 0): 2 x^3 + x - 3 = 0, at x = 1.
 * const problem = { residualCount: 2, residuals: ([x], r) => { r[0] = x - 3; r[1] = x * x } }
 * const { value, converged } = minimiseSquares(problem, [2])
 * converged // => true
 * Number(value[0].toFixed(9)) // => 1
 */
export function minimiseSquares(problem: LeastSquaresProblem, start: ArrayLike<number>, options: LeastSquaresOptions = {}): LeastSquaresResult {
  const resolved = resolveOptions(options, start)
  const wrong = inputProblem(start, problem.residualCount, resolved)
  if (wrong !== null) return refused(start, problem.residualCount, 'invalid-input', wrong)
  const evaluator = new Evaluator(problem, resolved)
  const point = evaluator.at(evaluator.clamp(Float64Array.from(start)))
  const jacobian = new Float64Array(point.residuals.length * start.length)
  if (point.sumOfSquares === Infinity || !evaluator.jacobian(point, jacobian)) {
    return refused(point.parameters, problem.residualCount, 'not-finite', undefined, evaluator.evaluations)
  }
  const descent = descend(evaluator, point, jacobian, resolved)
  const end = isConverged(descent.reason) ? polish(evaluator, descent, jacobian, resolved) : descent
  return resultAt(end, evaluator.evaluations, resolved)
}
