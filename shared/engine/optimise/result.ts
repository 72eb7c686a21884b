import { covarianceOf, rankAndCondition } from './covariance'
import type { ResolvedOptions } from './defaults'
import type { Descent } from './descend'
import { isConverged, reasonWords } from './messages'
import type { EndReason, LeastSquaresResult } from './types'

/**
 * The result that belongs to the end of a descent.
 *
 * @param evaluations calls of the residuals so far
 * @example
 * const point = { parameters: Float64Array.of(1), residuals: Float64Array.of(0, 4), sumOfSquares: 16 }
 * const linear = linearise(point, Float64Array.of(2, 0), resolveOptions({}, [1]))
 * // (J^T J)^-1 = 1/4, times 16 with one degree of freedom.
 * resultAt({ point, linear, reason: 'offset', iterations: 3 }, 4, resolveOptions({}, [1])).covariance // => [4]
 */
export function resultAt(descent: Descent, evaluations: number, options: ResolvedOptions): LeastSquaresResult {
  const { point, linear, iterations } = descent
  const m = point.residuals.length
  const dof = m - linear.free.length
  const { rank, condition } = rankAndCondition(linear)
  const determined = rank === linear.free.length
  const reason: EndReason = isConverged(descent.reason) && !determined ? 'undetermined' : descent.reason
  const factor = options.noise === 'absolute' ? 1 : dof > 0 ? point.sumOfSquares / dof : null
  return {
    value: point.parameters,
    covariance: determined && factor !== null && reason !== 'not-finite' ? covarianceOf(linear, factor) : null,
    sumOfSquares: point.sumOfSquares,
    residuals: point.residuals,
    dof,
    converged: isConverged(reason),
    reason,
    message: reasonWords[reason],
    iterations,
    evaluations,
    offset: linear.offset,
    atBound: linear.atBound,
    rank,
    condition,
  }
}

/**
 * The result of a fit that could not begin.
 *
 * @param start length n
 * @param residualCount m
 * @param message what is wrong, in words; that of the reason when absent
 * @example
 * refused([1], 0, 'invalid-input', 'There is nothing to fit.').converged // => false
 */
export function refused(start: ArrayLike<number>, residualCount: number, reason: 'invalid-input' | 'not-finite', message: string = reasonWords[reason], evaluations = 0): LeastSquaresResult {
  const n = start.length
  return {
    value: Float64Array.from(start), covariance: null, sumOfSquares: Infinity, residuals: new Float64Array(Math.max(0, residualCount | 0)),
    dof: residualCount - n, converged: false, reason, message, iterations: 0, evaluations, offset: 1,
    atBound: new Array<null>(n).fill(null), rank: 0, condition: Infinity,
  }
}
