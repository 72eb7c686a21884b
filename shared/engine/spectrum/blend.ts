import type { ModelLine, ObservableReading, RetrievalResult } from '../types'
import { blendFraction, blendWidths } from '../thresholds'
import { lineDistance } from './grouping'
import type { Measurement } from './measurement'
import { lineCentre, lineWeight, lowestEnergy } from './shares'

/** Measured lines must stand out by this many sigma to say how bright their band is. */
const bandSignal = 5

export interface Blend { line: ModelLine, neighbour: ModelLine, share: number, distance: number }

/** Scale of each band at T from its measured lines: sum of area times weight over sum of weight squared; absent where nothing was measured well. */
function bandScales(measurement: Measurement, weightOf: (line: ModelLine) => number): Map<string, number> {
  const sums = new Map<string, [number, number]>()
  const { areas, covariance } = measurement.set
  measurement.lines.forEach((line, i) => {
    const sigma = Math.sqrt(covariance[i * areas.length + i])
    if (line.mixesBands || !(areas[i] > bandSignal * sigma)) return
    const weight = weightOf(line)
    const [above, below] = sums.get(line.band) ?? [0, 0]
    sums.set(line.band, [above + areas[i] * weight, below + weight * weight])
  })
  return new Map([...sums].filter(([, [, below]]) => below > 0).map(([band, [above, below]]) => [band, above / below]))
}

/**
 * Lines that are not in the fit but would add to a used line, at the fitted temperature. A band of which nothing was measured is
 * taken to be as bright as the brightest measured one: a warning rather should come too often.
 */
export function findBlends(measurement: Measurement, outside: readonly ModelLine[], reading: ObservableReading, temperature: number): Blend[] {
  const fwhm = measurement.set.fwhm
  const everyLine = [...measurement.lines, ...outside]
  const zeros = new Map([...new Set(everyLine.map(line => line.band))].map(band => [band, lowestEnergy(everyLine.filter(line => line.band === band), reading)]))
  const weightOf = (line: ModelLine) => lineWeight(line, reading, temperature, zeros.get(line.band) ?? 0)
  const scales = bandScales(measurement, weightOf)
  const brightest = Math.max(0, ...scales.values())
  const expected = (line: ModelLine) => (scales.get(line.band) ?? brightest) * weightOf(line)
  return measurement.lines.flatMap((line, i) => {
    if (!measurement.used[i]) return []
    const own = expected(line)
    return outside.filter(other => lineDistance(line, other) <= blendWidths * fwhm)
      .map(neighbour => ({ line, neighbour, share: own > 0 ? expected(neighbour) / own : 0, distance: lineDistance(line, neighbour) }))
      .filter(blend => blend.share > blendFraction)
  })
}

/** A blend in words. */
export function blendCaution({ line, neighbour, share, distance }: Blend): string {
  return `${line.label} at ${lineCentre(line).toFixed(2)} nm is not alone: ${neighbour.label} stands ${distance.toFixed(3)} nm away and may add ${(100 * share).toFixed(0)} %.`
}

/** The result with what its blends say. */
export function withBlends(result: RetrievalResult, blends: Blend[]): RetrievalResult {
  if (blends.length === 0) return result
  return { ...result, flags: [...result.flags, 'blend'], cautions: [...result.cautions, ...blends.map(blendCaution)] }
}
