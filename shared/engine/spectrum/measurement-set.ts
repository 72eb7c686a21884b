import type { FlagName, LineMeasurementSet, SpectrumRetrievalInput } from '../types'
import { largeShiftWidths } from '../thresholds'
import { linearCovariance } from './covariance'
import type { FitOutcome } from './fit'
import type { Measurement } from './measurement'
import { degreesOfFreedom, failedMeasurement, lineSign } from './measurement'
import type { RejectedLine } from './placing'
import type { FitProblem } from './problem'
import { isSaturated } from './saturation'
import { airMismatch } from './air-mismatch'
import { lineCentre } from './shares'

/** Variance factor of the noise: 1 for known sigmas, chi2 / dof otherwise, with a floor far below rounding so that a perfect fit keeps a covariance. */
function noiseFactor(input: SpectrumRetrievalInput, problem: FitProblem, dof: number): number {
  if (input.noise === 'absolute' && input.spectrum.sigma !== null) return 1
  const largest = problem.pixels.values.reduce((most, value, p) => Math.max(most, Math.abs(value * problem.pixels.weight[p])), 0)
  return Math.max(problem.system.chi2 / dof, (1e-15 * largest) ** 2, Number.MIN_VALUE)
}

function flagsOf(input: SpectrumRetrievalInput, problem: FitProblem, outcome: FitOutcome, rejected: RejectedLine[]): FlagName[] {
  const fwhm = Math.exp(outcome.logWidth)
  const saturated = problem.lines.some((line, i) => problem.used[i] && isSaturated(input.spectrum, lineCentre(line) + outcome.shift, fwhm, lineSign(input)))
  const raised: [FlagName, boolean][] = [
    ['saturated', saturated],
    ['not-converged', !outcome.converged],
    ['sigma-assumed', input.spectrum.sigma === null],
    ['line-rejected', rejected.length > 0],
    ['shift-large', Math.abs(outcome.shift) > largeShiftWidths * fwhm],
  ]
  return raised.filter(([, is]) => is).map(([name]) => name)
}

function areaBlock(covariance: Float64Array, size: number, count: number, factor: number): number[] {
  return Array.from({ length: count * count }, (_, k) => factor * covariance[Math.floor(k / count) * size + k % count])
}

/** Squares of very large or very small numbers leave the range of a double. */
function isFinite({ areas, covariance, continuum, shift, uShift, fwhm, uFwhm, chi2, noiseFromResiduals }: LineMeasurementSet): boolean {
  return [...areas, ...covariance, ...continuum, shift, uShift, fwhm, uFwhm, chi2, noiseFromResiduals].every(number => number === null || Number.isFinite(number))
}

/** Puts the solved fit into the durable form. */
export function summarise(input: SpectrumRetrievalInput, problem: FitProblem, outcome: FitOutcome, outside: RejectedLine[]): Measurement {
  const rejected = [...outside, ...problem.rejected]
  const { system, pixels, lines } = problem
  if (!Number.isFinite(system.chi2)) return failedMeasurement(outcome.reason, rejected)
  const air = airMismatch(problem, outcome, lineSign(input))
  if (air) return failedMeasurement(air, rejected)
  const dof = degreesOfFreedom(problem, input)
  const factor = noiseFactor(input, problem, dof)
  const fwhm = Math.exp(outcome.logWidth)
  const fromResiduals = input.spectrum.sigma === null
  const set: LineMeasurementSet = {
    converged: outcome.converged,
    iterations: outcome.iterations,
    reason: outcome.reason,
    labels: lines.map(line => line.label),
    areas: Array.from(system.solution.subarray(0, lines.length)),
    covariance: areaBlock(linearCovariance(system, outcome), system.size, lines.length, factor),
    shift: outcome.shift,
    uShift: input.shift === 'free' ? Math.sqrt(factor * outcome.inverse[0]) : null,
    fwhm,
    uFwhm: input.profile.fwhm === null ? fwhm * Math.sqrt(factor * outcome.inverse[2]) : null,
    continuum: Array.from(system.solution.subarray(lines.length)),
    chi2: fromResiduals ? system.chi2 / factor : system.chi2,
    dof,
    noiseFromResiduals: fromResiduals ? Math.sqrt(factor) : null,
    pixelRange: [pixels.index[0], pixels.index[pixels.count - 1]],
    flags: flagsOf(input, problem, outcome, rejected),
  }
  if (!isFinite(set)) return failedMeasurement('The numbers of the spectrum are too large or too small to be fitted.', rejected)
  return { set, lines, used: problem.used, rejected, fit: { problem, outcome } }
}
