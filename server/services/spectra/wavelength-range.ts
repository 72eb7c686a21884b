import { normaliseSpectrum } from '#shared/engine/units/normalise'
import type { ReadSpectrum, SpectrumAbout } from '#shared/types/spectrum'

/** Both ends in vacuum nm, null while the axis is not fully known. */
export function wavelengthRange({ axis }: ReadSpectrum, about: SpectrumAbout): { wavelengthFrom: number | null, wavelengthTo: number | null } {
  const ends = Float64Array.of(axis[0]!, axis.at(-1)!)
  const normal = normaliseSpectrum({ axis: ends, values: ends, sigma: null }, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in normal) return { wavelengthFrom: null, wavelengthTo: null }
  return { wavelengthFrom: normal.wavelength[0]!, wavelengthTo: normal.wavelength[1]! }
}
