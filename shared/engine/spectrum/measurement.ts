import type { LineMeasurementSet, ModelLine, SpectrumInput, SpectrumRetrievalInput } from '../types'
import type { FitOutcome } from './fit'
import { fitShiftAndWidth } from './fit'
import { summarise } from './measurement-set'
import { pixelsWithin } from './pixels'
import type { RejectedLine } from './placing'
import { noneInside, placeLines, spectrumProblem } from './placing'
import type { FitProblem } from './problem'
import { fitWindow, integratedBelow, integratedProblem, layOutProblem } from './problem'
import { startPoint } from './start'
import { scanReach } from './start-shift'
import { widthOfStrongest } from './start-width'

/** A measurement with what the retrieval needs beyond the durable set. */
export interface Measurement {
  set: LineMeasurementSet
  /** In the order of the set's labels. */
  lines: ModelLine[]
  used: boolean[]
  rejected: RejectedLine[]
  /** The solved fit; null when there was none. */
  fit: { problem: FitProblem, outcome: FitOutcome } | null
}

/** A measurement that could not be made. */
export function failedMeasurement(reason: string, rejected: RejectedLine[]): Measurement {
  const set: LineMeasurementSet = {
    converged: false, iterations: 0, reason, labels: [], areas: [], covariance: [], shift: 0, uShift: null, fwhm: 0, uFwhm: null,
    continuum: [], chi2: 0, dof: 0, noiseFromResiduals: null, pixelRange: [0, 0], flags: ['not-converged'],
  }
  return { set, lines: [], used: [], rejected, fit: null }
}

/** Dips for equivalent widths, peaks for everything else. */
export const lineSign = (input: SpectrumRetrievalInput): 1 | -1 => input.reading.observable === 'equivalent-width' ? -1 : 1

function meanPixel({ wavelength }: SpectrumInput, around: number): number {
  let i = 1
  while (i < wavelength.length - 1 && wavelength[i] < around) i++
  const low = Math.max(0, i - 5)
  const high = Math.min(wavelength.length - 1, i + 5)
  return (wavelength[high] - wavelength[low]) / (high - low)
}

function expectedWidth(input: SpectrumRetrievalInput, used: ModelLine[], pixel: number): number | null {
  const known = input.profile.fwhm ?? input.fwhmStart ?? null
  if (known !== null) return known > 0 && Number.isFinite(known) ? known : null
  const [from, to] = fitWindow(used, pixel, pixel)
  const pixels = pixelsWithin(input.spectrum, from, to, input.masks)
  return pixels.count < 5 ? null : widthOfStrongest(pixels, lineSign(input))
}

interface Attempt { problem: FitProblem, outcome: FitOutcome }

function attempt(input: SpectrumRetrievalInput, used: ModelLine[], others: ModelLine[], fwhm: number, pixel: number, guessed: boolean): Attempt | FitProblem {
  let problem = layOutProblem(input, used, others, fwhm, pixel)
  if (!problem.used.includes(true) || degreesOfFreedom(problem, input) < 1) return problem
  const free = { shift: input.shift === 'free', width: input.profile.fwhm === null }
  const limits = {
    shift: (scanReach + 1) * fwhm,
    width: (free.width ? [0.2 * pixel, Math.max(20 * fwhm, 5 * pixel)] : [fwhm, fwhm]) as [number, number],
  }
  const start = startPoint(problem, fwhm, free, guessed, lineSign(input))
  let outcome = fitShiftAndWidth(problem.system, start, free, limits)
  if (!problem.system.columns.integrated && Math.exp(outcome.logWidth) < integratedBelow * pixel) {
    problem = integratedProblem(problem, input.continuumOrder)
    outcome = fitShiftAndWidth(problem.system, { shift: outcome.shift, logWidth: outcome.logWidth }, free, limits)
  }
  return { problem, outcome }
}

/** Pixels minus parameters. */
export function degreesOfFreedom(problem: FitProblem, input: SpectrumRetrievalInput): number {
  const nonlinear = (input.shift === 'free' ? 1 : 0) + (input.profile.fwhm === null ? 1 : 0)
  return problem.pixels.count - problem.system.size - nonlinear
}

const farFrom = (fwhm: number, expected: number) => fwhm > 1.3 * expected || fwhm < expected / 1.3

/** Measures the lines; the layout (window, lines that share an area) is made anew once when the width comes out far from the expected one. */
export function measure(given: SpectrumRetrievalInput): Measurement {
  const input = given.noise === 'from-residuals' ? { ...given, spectrum: { ...given.spectrum, sigma: null } } : given
  const chosen = input.usedLabels && new Set(input.usedLabels)
  const isUsed = (line: ModelLine) => !chosen || chosen.has(line.label)
  const wanted = input.lines.filter(isUsed)
  const problem = spectrumProblem(input.spectrum)
  if (problem) return failedMeasurement(problem, wanted.map(line => ({ line, reason: 'the spectrum cannot be read' })))
  const { inside, outside } = placeLines(wanted, input.spectrum)
  if (inside.length === 0) return failedMeasurement(noneInside(wanted, input.spectrum), outside)
  const others = placeLines(input.lines.filter(line => !isUsed(line)), input.spectrum).inside
  const pixel = meanPixel(input.spectrum, fitWindow(inside, 0, 0)[0])
  const expected = expectedWidth(input, inside, pixel)
  const guessed = input.profile.fwhm === null && input.fwhmStart === undefined
  let tried = expected === null ? null : attempt(input, inside, others, expected, pixel, guessed)
  if (tried && 'outcome' in tried && expected !== null && tried.outcome.converged && farFrom(Math.exp(tried.outcome.logWidth), expected)) {
    tried = attempt(input, inside, others, Math.exp(tried.outcome.logWidth), pixel, false)
  }
  if (tried === null || !('outcome' in tried)) return failedMeasurement('Too few usable pixels around the lines.', [...outside, ...tried?.rejected ?? []])
  return summarise(input, tried.problem, tried.outcome, outside)
}

/**
 * Measures all lines of a spectrum at once: one area per line with its full covariance, a common shift and width, a Legendre continuum.
 * Never throws for bad data; what could not be done is said in `reason`.
 */
export function measureLines(input: SpectrumRetrievalInput): LineMeasurementSet {
  return measure(input).set
}
