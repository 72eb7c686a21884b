import type { LeastSquaresResult } from '../optimise/types'
import type { TableFit } from '../retrieve/fit-table'
import { chiSquareTail } from '../statistics/chi-square'
import { normalCoverage } from '../statistics/normal'
import { studentCoverageFactor } from '../statistics/student-t'
import { twoTemperatureLines, twoTemperatureProbability } from '../thresholds'
import type { Interval, TwoTemperatureResult, TwoTemperatureSettings } from '../types'
import { bootstrapProbability, improvement } from './bootstrap'
import { fitPair } from './fit-pair'
import { betaUncertainty, gasOf } from './gas'
import type { GasFit } from './gas'
import { correctedAkaike } from './information'
import { PairGrid } from './pair-grid'
import { pairInterval } from './pair-interval'
import { PairModel } from './pair-model'

/** Draws of the bootstrap done and asked for. */
export interface TwoTemperatureProgress { draws: number, of: number }

/** A second temperature that lowers chi2 by less than this part of it is the first one again ... */
const noticeable = 1e-6
/** ... and so is one that lowers it by less than this part of the data's squares: that is rounding. */
const rounding = 1e-14

const nothing = { gases: null, chi2: null, pValue: null, improvement: null, probability: null, aicc: null, model: null, preferred: false } as const

/**
 * Estimator 4: two temperatures T1 < T2 whose gases add up, m_i = w_i (s_1 phi_i(T1) + s_2 phi_i(T2)), s >= 0, beside a fit with one.
 *
 * Only with six used lines or more. Whether the second one is more than noise is told by a parametric bootstrap with a stored seed;
 * AICc is given from eight lines on. The choice is never made here: both fits are shown.
 * Temperatures in K with profile-likelihood intervals; scales refer to energies above the lowest used one.
 * Takes some milliseconds for each draw; yields at least once a draw, so that the caller can stop or do other things.
 *
 * @param fitted the fit with one temperature
 * @param settings number of draws (1 .. ) and their seed
 */
export function* twoTemperatures(fitted: TableFit, settings: TwoTemperatureSettings): Generator<TwoTemperatureProgress, TwoTemperatureResult> {
  const { draws, seed } = settings
  const n = fitted.table.lines.length
  const known = fitted.table.noise === 'absolute'
  const statistic = known ? 'difference' : 'ratio'
  const dof = n - 2 - 2 * fitted.bands.length
  const plain = { ...nothing, dof: Math.max(0, dof), statistic, draws, seed } as const
  const impossible = tooFew(n, dof, known)
  if (impossible) return { ...plain, reason: impossible }
  const progress = (done: number): TwoTemperatureProgress => ({ draws: done, of: draws })
  yield progress(0)
  const model = new PairModel(fitted.profile.problem)
  const grid = new PairGrid(model)
  yield progress(0)
  const fit = yield* announced(fitPair(model, grid), progress(0))
  const one = fitted.fit.chi2
  const two = fit && one - fit.sumOfSquares > noticeable * one + rounding * fitted.profile.dataSquares ? fit.sumOfSquares : one
  const observed = improvement(one, two, statistic)
  const probability = observed > 0 ? yield* counted(bootstrapProbability(model, grid, observed, { expected: onesModel(fitted), varianceFactor: fitted.varianceFactor ?? 1, statistic }, draws, seed), progress) : 1
  const aicc = akaike(one, two, fitted, known)
  const tested = { ...plain, improvement: observed, probability, aicc, preferred: probability < twoTemperatureProbability }
  if (!fit || !(observed > 0) || !bothSeen(fit, model)) return { ...tested, preferred: false, reason: 'A second temperature takes nothing from chi2: the lines show one gas.' }
  const varianceFactor = known ? 1 : two / dof
  const gases = yield* announced(bothGases({ fitted, model, fit, varianceFactor }, known, dof), progress(draws))
  return {
    ...tested,
    gases,
    ...(fit.converged || fit.reason === 'undetermined' ? {} : { reason: `The fit of two temperatures did not settle: ${fit.message}` }),
    chi2: fitted.table.noise === 'from-residuals' ? null : two,
    pValue: known && dof > 0 ? chiSquareTail(two, dof) : null,
    model: Array.from(sumOf(model.intensities(fit.value))),
  }
}

function tooFew(n: number, dof: number, known: boolean): string | undefined {
  if (n < twoTemperatureLines) return `Two temperatures need at least ${twoTemperatureLines} used lines; there are ${n}.`
  if (dof < (known ? 0 : 1)) return `${n} lines do not determine two temperatures and two scales for each band; use common scales, fewer bands or more lines.`
}

function* announced<T, P>(steps: Generator<void, T>, progress: P): Generator<P, T> {
  let step = steps.next()
  for (; !step.done; step = steps.next()) yield progress
  return step.value
}

function* counted<T, P>(steps: Generator<number, T>, progress: (done: number) => P): Generator<P, T> {
  let step = steps.next()
  for (; !step.done; step = steps.next()) yield progress(step.value)
  return step.value
}

/** Intensities of the one-temperature fit. */
function onesModel({ profile, fit }: TableFit): Float64Array {
  const { problem } = profile
  profile.evaluate(fit.beta)
  const parameters = Float64Array.of(fit.beta, fit.beta, ...profile.scales, ...profile.scales.map(() => 0))
  return new PairModel(problem).intensities(parameters)[0]
}

function bothSeen({ value }: LeastSquaresResult, { bandCount }: PairModel): boolean {
  const seen = (gas: 0 | 1) => value.subarray(2 + gas * bandCount, 2 + (gas + 1) * bandCount).some(scale => scale > 0)
  return seen(0) && seen(1) && value[0] > value[1]
}

const sumOf = ([a, b]: [Float64Array, Float64Array]) => a.map((value, i) => value + b[i])

function akaike(one: number, two: number, { table, bands }: TableFit, known: boolean): TwoTemperatureResult['aicc'] {
  const n = table.lines.length
  const [first, second] = [correctedAkaike(one, n, 1 + bands.length, known), correctedAkaike(two, n, 2 + 2 * bands.length, known)]
  return first === null || second === null ? null : { one: first, two: second }
}

/** Both gases with their intervals: chi2 rises by k^2, or by t^2 of the degrees of freedom where the noise is known up to a factor. */
function* bothGases(source: Omit<GasFit, 'gas'>, known: boolean, dof: number): Generator<void, NonNullable<TwoTemperatureResult['gases']>> {
  const rise = (k: number) => known ? k * k : studentCoverageFactor(normalCoverage(k), dof) ** 2 * source.varianceFactor
  const cold = yield* withIntervals({ ...source, gas: 0 }, rise)
  const hot = yield* withIntervals({ ...source, gas: 1 }, rise)
  return [cold, hot]
}

function* withIntervals(source: GasFit, rise: (k: number) => number): Generator<void, ReturnType<typeof gasOf>> {
  const { model, fit, gas } = source
  const u = (betaUncertainty(source) ?? 0.01 * fit.value[gas]) / Math.sqrt(source.varianceFactor)
  const intervals: Interval[] = []
  for (const k of [1, 2]) intervals.push(yield* pairInterval(model, model.problem.intensity, fit.value, fit.sumOfSquares, gas, u, rise(k)))
  return gasOf(source, intervals[0], intervals[1])
}
