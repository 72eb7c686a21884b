import type { ResolvedOptions } from './defaults'
import type { Descent } from './descend'
import { linearise } from './linearisation'
import type { Evaluator } from './point'
import { dampedStep } from './step'

/**
 * Undamped Gauss-Newton steps after convergence, each kept only when it shrinks the offset and does not raise the sum of squares
 * beyond its rounding. Near a minimum the sum of squares is flat and sees half the digits of the parameters; the offset sees them all.
 * Derivatives by differences are taken with the finer rule here.
 *
 * @param jacobian that of `descent.point`, m x n; overwritten
 * @example
 * const options = resolveOptions({}, [2])
 * const evaluator = new Evaluator({ residualCount: 2, residuals: ([x], r) => { r[0] = x - 3; r[1] = x * x } }, options)
 * const point = evaluator.at(Float64Array.of(1.001))
 * const jacobian = new Float64Array(2)
 * evaluator.jacobian(point, jacobian)
 * const rough = { point, linear: linearise(point, jacobian, options), reason: 'reduction', iterations: 4 }
 * Number(polish(evaluator, rough, jacobian, options).point.parameters[0].toFixed(9)) // => 1
 */
export function polish(evaluator: Evaluator, descent: Descent, jacobian: Float64Array, options: ResolvedOptions): Descent {
  let { point, linear, iterations } = descent
  if (evaluator.usesDifferences && evaluator.jacobian(point, jacobian, 4)) linear = linearise(point, jacobian, options, evaluator.resolution)
  for (let step = 0; step < options.polishSteps && linear.offset > 0; step++) {
    const change = dampedStep(linear, 0)
    if (!change) break
    const trial = evaluator.after(point, change)
    iterations++
    if (!(trial.sumOfSquares <= point.sumOfSquares + linear.rounding) || !evaluator.jacobian(trial, jacobian, 4)) break
    const next = linearise(trial, jacobian, options, evaluator.resolution)
    if (!(next.offset < linear.offset)) break
    point = trial
    linear = next
  }
  return { ...descent, point, linear, iterations }
}
