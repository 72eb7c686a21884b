import { nthSmallest } from '../statistics/nth-smallest'
import type { FitPixels } from './pixels'

/** Value that a quarter of the pixels lie below: a floor that lines do not lift. */
export function lowerQuartile(values: Float64Array): number {
  return nthSmallest(values.slice(), Math.floor(values.length / 4))
}

/** Distance from pixel `peak` to where the signal falls to `half`, going by `step`, nm. */
function halfDistance(x: Float64Array, signal: Float64Array, peak: number, half: number, step: 1 | -1): number {
  let p = peak
  while (p + step >= 0 && p + step < signal.length && signal[p + step] > half) p += step
  const next = p + step
  if (next < 0 || next >= signal.length) return Math.abs(x[p] - x[peak])
  const part = (signal[p] - half) / (signal[p] - signal[next])
  return Math.abs(x[p] + part * (x[next] - x[p]) - x[peak])
}

/** FWHM of the strongest feature, nm, read off at half its height. `sign` -1 when lines are dips. Never below 0.7 pixel. */
export function widthOfStrongest(pixels: FitPixels, sign: 1 | -1): number {
  const signal = pixels.values.map(value => sign * value)
  const floor = lowerQuartile(signal)
  let peak = 0
  for (let p = 1; p < signal.length; p++) if (signal[p] > signal[peak]) peak = p
  const half = (signal[peak] + floor) / 2
  const width = halfDistance(pixels.wavelength, signal, peak, half, 1) + halfDistance(pixels.wavelength, signal, peak, half, -1)
  return Math.max(width, 0.7 * pixels.width[peak])
}
