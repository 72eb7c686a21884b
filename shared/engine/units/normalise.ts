import type { SpectrumInput } from '../types'
import type { AxisReading } from './axis'
import { toVacuumNanometre } from './axis'

export interface RawSpectrum {
  axis: ArrayLike<number>
  values: ArrayLike<number>
  sigma: ArrayLike<number> | null
}

const ordered = (data: ArrayLike<number>, reverse: boolean) => {
  const copy = Float64Array.from(data)
  return reverse ? copy.reverse() : copy
}

/** A spectrum as read to one on rising vacuum nm; values and sigmas follow their pixels and keep their unit. */
export function normaliseSpectrum(raw: RawSpectrum, reading: AxisReading): SpectrumInput | { problem: string } {
  if (raw.values.length !== raw.axis.length) return { problem: `The axis has ${raw.axis.length} points, the values ${raw.values.length}.` }
  if (raw.sigma && raw.sigma.length !== raw.axis.length) return { problem: `The axis has ${raw.axis.length} points, the sigmas ${raw.sigma.length}.` }
  const axis = toVacuumNanometre(raw.axis, reading)
  if ('problem' in axis) return axis
  return {
    wavelength: axis.descending ? axis.wavelength.reverse() : axis.wavelength,
    values: ordered(raw.values, axis.descending),
    sigma: raw.sigma && ordered(raw.sigma, axis.descending),
  }
}
