import type { SpectrumInput } from '../types'
import { saturatedEqualMaxima } from '../thresholds'
import { lowerBound } from './pixels'

/**
 * Is a line at (nm) saturated: a pixel within one FWHM at or above the full scale, or three neighbouring pixels that equal the line's maximum?
 * `sign` -1 when lines are dips: only the full scale counts then.
 */
export function isSaturated({ wavelength, values, fullScale }: SpectrumInput, centre: number, fwhm: number, sign: 1 | -1): boolean {
  const from = lowerBound(wavelength, centre - fwhm)
  const to = lowerBound(wavelength, centre + fwhm)
  let largest = -Infinity
  for (let i = from; i < to; i++) if (values[i] > largest) largest = values[i]
  if (fullScale !== undefined && largest >= fullScale) return true
  if (sign < 0) return false
  let run = 0
  for (let i = from; i < to; i++) {
    run = values[i] === largest ? run + 1 : 0
    if (run === saturatedEqualMaxima) return true
  }
  return false
}
