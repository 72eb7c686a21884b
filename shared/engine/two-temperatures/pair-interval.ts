import { minimiseSquares } from '../optimise/minimise-squares'
import type { Interval } from '../types'
import { pairBounds } from './fit-pair'
import type { PairModel } from './pair-model'

/** chi2 of the best fit is found to this part of the rise; the ends of the interval to as much of its width. */
const tolerance = 1e-4

/**
 * Interval of one of the two temperatures where chi2, at its best in everything else, stays within `rise` of its minimum
 * (profile likelihood), K. The other temperature stays on its side. A side on which chi2 never rises that far is open (null).
 * Yields between evaluations.
 *
 * @param best parameters of the minimum
 * @param chi2 its chi2
 * @param gas 0: the cold one, 1: the hot one
 * @param uBeta standard uncertainty of its beta, a first step
 */
export function* pairInterval(model: PairModel, intensity: Float64Array, best: Float64Array, chi2: number, gas: 0 | 1, uBeta: number, rise: number): Generator<void, Interval> {
  const [low, high] = model.problem.betaRange
  const cold = yield* crossing(excessOf(model, intensity, best, gas, chi2 + rise), best[gas], high, uBeta * Math.sqrt(rise), rise)
  const hot = yield* crossing(excessOf(model, intensity, best, gas, chi2 + rise), best[gas], low, uBeta * Math.sqrt(rise), rise)
  return [cold === null ? null : 1 / cold, hot === null ? null : 1 / hot]
}

/** chi2 above the target as a function of one beta, the rest fitted anew from where the last call ended. */
function excessOf(model: PairModel, intensity: Float64Array, best: Float64Array, gas: 0 | 1, target: number): (beta: number) => number {
  const problem = model.leastSquares(intensity)
  let from = best
  return (beta) => {
    const { lower, upper } = pairBounds(model)
    lower[gas] = upper[gas] = beta
    if (gas === 0) upper[1] = beta
    else lower[0] = beta
    const start = from.slice()
    start[gas] = beta
    const fit = minimiseSquares(problem, start, { lower, upper, noise: 'absolute', polishSteps: 0, reductionTolerance: 1e-9, maxIterations: 300 })
    from = fit.value
    return fit.sumOfSquares - target
  }
}

/** The first beta from `best` towards `end` at which the excess is zero; null when it stays below. */
function* crossing(excess: (beta: number) => number, best: number, end: number, step: number, rise: number): Generator<void, number | null> {
  const direction = Math.sign(end - best)
  if (direction === 0) return null
  let inside = best
  let below = -rise
  let length = Math.max(step, 1e-9 * best)
  for (;;) {
    const outside = direction > 0 ? Math.min(end, inside + length) : Math.max(end, inside - length)
    const above = excess(outside)
    yield
    if (above >= 0) return yield* bisect(excess, inside, below, outside, above, rise)
    if (outside === end) return null
    inside = outside
    below = above
    length *= 1.6
  }
}

/** Root between a point below and one above zero: regula falsi in the Illinois form (Dowell & Jarratt 1971). */
function* bisect(excess: (beta: number) => number, inside: number, below: number, outside: number, above: number, rise: number): Generator<void, number> {
  let [a, fa, b, fb] = [inside, below, outside, above]
  let last = 0
  for (let i = 0; i < 60; i++) {
    const x = (a * fb - b * fa) / (fb - fa)
    const f = excess(x)
    yield
    if (Math.abs(f) <= tolerance * rise || Math.abs(b - a) <= 1e-12 * Math.abs(x)) return x
    if (f < 0) {
      [a, fa] = [x, f]
      if (last < 0) fb /= 2
    }
    else {
      [b, fb] = [x, f]
      if (last > 0) fa /= 2
    }
    last = Math.sign(f)
  }
  return (a + b) / 2
}
