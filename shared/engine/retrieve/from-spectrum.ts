import { orderedFlags } from '../flags'
import { areaFactor } from '../spectrum/area-factor'
import { findBlends, withBlends } from '../spectrum/blend'
import type { Measurement } from '../spectrum/measurement'
import { measure } from '../spectrum/measurement'
import { drawPicture } from '../spectrum/picture'
import { lineCentre } from '../spectrum/shares'
import { continuumAt } from '../spectrum/continuum-at'
import type { AlternativeStrengths, LineRetrievalInput, MeasuredLine, ModelLine, RetrievalResult, SpectrumRetrievalInput } from '../types'
import { retrieveFromLines } from './from-lines'

/** What an area is multiplied by to become the observable's intensity. */
function intensityFactors(input: SpectrumRetrievalInput, { set, lines, fit }: Measurement): number[] {
  const axis = input.integrateOver ?? 'wavelength'
  return lines.map((line) => {
    const factor = areaFactor(lineCentre(line), axis)
    if (input.reading.observable !== 'equivalent-width' || !fit) return factor
    // A dip below a continuum of 1 has a positive width.
    return -factor / continuumAt(set.continuum, fit.problem.window, lineCentre(line) + set.shift)
  })
}

function measuredLines(measurement: Measurement, factors: number[]): MeasuredLine[] {
  const { areas, covariance } = measurement.set
  const n = areas.length
  const measured = measurement.lines.map((line, i) => ({
    ...line,
    intensity: factors[i] * areas[i],
    sigma: Math.abs(factors[i]) * Math.sqrt(covariance[i * n + i]),
    used: measurement.used[i],
  }))
  const rejected = measurement.rejected.map(({ line, reason }) => ({ ...line, intensity: 0, sigma: null, used: false, reason }))
  return [...measured, ...rejected]
}

/** Covariance of the measured lines, with empty rows for those that were not measured. */
function intensityCovariance({ set, rejected }: Measurement, factors: number[]): number[] {
  const n = set.areas.length
  const size = n + rejected.length
  const out = new Array<number>(size * size).fill(0)
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) out[i * size + j] = factors[i] * factors[j] * set.covariance[i * n + j]
  return out
}

/** The other strength sets in the order of the lines that go on; lines that share an area have none. */
function reorder(alternatives: AlternativeStrengths[] | undefined, given: ModelLine[], lines: ModelLine[]): AlternativeStrengths[] | undefined {
  const places = lines.map(line => given.findIndex(one => one.label === line.label && one.band === line.band))
  return alternatives?.map(set => ({ ...set, einsteinA: places.map(place => place === -1 ? null : set.einsteinA[place] ?? null) }))
}

function lineInput(input: SpectrumRetrievalInput, measurement: Measurement): LineRetrievalInput {
  const factors = intensityFactors(input, measurement)
  const lines = measuredLines(measurement, factors)
  return {
    reading: input.reading,
    lines,
    covariance: intensityCovariance(measurement, factors),
    // The pixels have already said how large the noise is.
    noise: 'absolute',
    temperatureRange: input.temperatureRange,
    bandScales: input.bandScales,
    strengthSet: input.strengthSet,
    alternatives: reorder(input.alternatives, input.lines, lines),
    twoTemperatures: input.twoTemperatures,
    priorFlags: measurement.set.flags,
    cautions: input.cautions,
  }
}

/** Lines given or known of whose areas are not in the fit. */
function linesOutside(input: SpectrumRetrievalInput, measurement: Measurement): ModelLine[] {
  const inFit = new Set(measurement.lines.flatMap(line => line.components))
  return [...input.lines, ...input.neighbours ?? []].filter(line => !inFit.has(line.components[0]))
}

/**
 * Rotational temperature from a spectrum: every line's area with the full covariance, then the envelope fit of the used ones.
 * Wavelengths in vacuum nm; for emission on a wavelength axis an area is the line's intensity, otherwise see `integrateOver`.
 * Never throws for data; whatever fails comes back as `temperature: null` with a reason in words.
 */
export function retrieveFromSpectrum(input: SpectrumRetrievalInput): RetrievalResult {
  const measurement = measure(input)
  const { set, fit } = measurement
  const result = retrieveFromLines(lineInput(input, measurement))
  const picture = fit ? drawPicture(input.spectrum, fit.problem) : { wavelength: [], values: [], model: [], continuum: [] }
  const withSpectrum: RetrievalResult = { ...result, converged: result.converged && set.converged, spectrum: { measurement: set, picture } }
  if (!fit) return { ...withSpectrum, temperature: null, reason: set.reason }
  if (result.temperature === null) return withSpectrum
  const blended = withBlends(withSpectrum, findBlends(measurement, linesOutside(input, measurement), input.reading, result.temperature.value))
  return { ...blended, flags: orderedFlags(blended.flags) }
}
