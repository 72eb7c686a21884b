import type { ResolvedOptions } from './defaults'
import { linearise } from './linearisation'
import type { Linearisation } from './linearisation'
import type { Evaluator, Point } from './point'
import { dampedStep, predictedReduction } from './step'
import type { EndReason } from './types'

/** Where a descent stands. */
export interface Descent {
  point: Point
  linear: Linearisation
  reason: EndReason
  /** Steps tried. */
  iterations: number
}

/** Offset below which a standstill is the rounding of the sum of squares: parameters are then within 1e-4 of their uncertainty. */
const negligibleOffset = 1e-4
/** A rejected step ends the descent when even the undamped one could gain no more than this many times the rounding. */
const roundingShare = 1

/**
 * Levenberg-Marquardt: steps that lower the sum of squares are taken, others are undone and damped more
 * (Madsen, Nielsen & Tingleff 2004, algorithm 3.16, with the damping of Nielsen 1999, their 2.21).
 * The point never becomes worse.
 *
 * @param start finite residuals
 * @param jacobian that of `start`, m x n; holds that of the last point afterwards
 * @example
 * const options = resolveOptions({}, [1])
 * const evaluator = new Evaluator({ residualCount: 2, residuals: ([x], r) => { r[0] = x - 3; r[1] = x * x } }, options)
 * const start = evaluator.at(Float64Array.of(2))
 * const jacobian = new Float64Array(2)
 * evaluator.jacobian(start, jacobian)
 * Number(descend(evaluator, start, jacobian, options).point.parameters[0].toFixed(6)) // => 1
 */
export function descend(evaluator: Evaluator, start: Point, jacobian: Float64Array, options: ResolvedOptions): Descent {
  let point = start
  let linear = linearise(point, jacobian, options, evaluator.resolution)
  let damping = options.damping
  let growth = 2
  const end = (reason: EndReason, iterations: number): Descent => ({ point, linear, reason, iterations })
  for (let iteration = 1; iteration <= options.maxIterations; iteration++) {
    if (point.sumOfSquares === 0) return end('exact', iteration - 1)
    if (linear.offset <= options.offsetTolerance) return end('offset', iteration - 1)
    if (options.stop()) return end('stopped', iteration - 1)
    const change = dampedStep(linear, damping)
    const trial = change && evaluator.after(point, change)
    if (!trial || !(trial.sumOfSquares < point.sumOfSquares)) {
      const standstill = trial && standstillReason(trial, point, linear)
      if (standstill) return end(standstill, iteration)
      damping *= growth
      growth *= 2
      continue
    }
    const predicted = predictedReduction(linear, trial.parameters.map((value, j) => value - point.parameters[j]))
    const gain = (point.sumOfSquares - trial.sumOfSquares) / predicted
    const small = damping > 1 ? null : smallStep(trial, point, predicted, options)
    // Nielsen 1999: 1/3 at least, so that one good step does not undo all damping.
    damping *= Math.max(1 / 3, 1 - (2 * gain - 1) ** 3)
    growth = 2
    point = trial
    if (!evaluator.jacobian(point, jacobian)) return end('not-finite', iteration)
    linear = linearise(point, jacobian, options, evaluator.resolution)
    if (small) return end(small, iteration)
  }
  return end('iteration-limit', options.maxIterations)
}

/** Why a rejected step is the last, or null. */
function standstillReason(trial: Point, point: Point, linear: Linearisation): EndReason | null {
  if (linear.offset ** 2 * point.sumOfSquares <= roundingShare * linear.rounding) return 'rounding'
  if (trial.parameters.some((value, j) => Math.abs(value - point.parameters[j]) > Number.EPSILON * Math.abs(value))) return null
  return linear.offset <= negligibleOffset ? 'rounding' : 'stalled'
}

/** Why an accepted step is the last, or null; asked only of steps with little damping, others are short by force. */
function smallStep(trial: Point, point: Point, predicted: number, options: ResolvedOptions): EndReason | null {
  const still = trial.parameters.every((value, j) => Math.abs(value - point.parameters[j]) <= options.stepTolerance * Math.abs(value))
  if (still) return 'step'
  const floor = options.reductionTolerance * point.sumOfSquares
  return point.sumOfSquares - trial.sumOfSquares <= floor && predicted <= floor ? 'reduction' : null
}
