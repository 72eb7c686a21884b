import type { FitLine } from './columns'
import type { FitPixels } from './pixels'
import { lowerBound } from './pixels'

/** The scan goes this many FWHM to either side. */
export const scanReach = 3
const stepsPerFwhm = 4

/** A line with how strong it is expected to be, relative to the others. */
export interface WeightedLine extends FitLine { weight: number }

/** Mean signal at the places of the lines, displaced by a shift: high where lines stand. */
export function shiftScore(pixels: FitPixels, running: Float64Array, lines: readonly WeightedLine[], fwhm: number, shift: number): number {
  let score = 0
  for (const line of lines) {
    for (const { wavelength, share } of line.components) {
      const from = lowerBound(pixels.wavelength, wavelength + shift - fwhm / 2)
      const to = lowerBound(pixels.wavelength, wavelength + shift + fwhm / 2)
      if (to > from) score += line.weight * share * (running[to] - running[from]) / (to - from)
    }
  }
  return score
}

/** Running sum of signal above its mean, so that a mean over any range costs two look-ups. */
export function runningSum(values: Float64Array, sign: 1 | -1): Float64Array {
  let total = 0
  for (const value of values) total += value
  const mean = total / values.length
  const sum = new Float64Array(values.length + 1)
  for (let p = 0; p < values.length; p++) sum[p + 1] = sum[p] + sign * (values[p] - mean)
  return sum
}

/** Shifts (nm) worth trying as a start: none, and the two best local maxima of the score within three FWHM. */
export function shiftCandidates(pixels: FitPixels, lines: readonly WeightedLine[], fwhm: number, sign: 1 | -1): number[] {
  const running = runningSum(pixels.values, sign)
  const last = scanReach * stepsPerFwhm
  const shifts = Array.from({ length: 2 * last + 1 }, (_, i) => (i - last) * fwhm / stepsPerFwhm)
  const scores = shifts.map(shift => shiftScore(pixels, running, lines, fwhm, shift))
  const maxima = shifts.map((_, i) => i).filter(i => scores[i] >= (scores[i - 1] ?? -Infinity) && scores[i] >= (scores[i + 1] ?? -Infinity))
  const best = maxima.sort((a, b) => scores[b] - scores[a]).slice(0, 2).map(i => shifts[i])
  return [...new Set([0, ...best])]
}
