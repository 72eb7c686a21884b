import { normaliseSpectrum } from '#shared/engine/units/normalise'
import type { SpectrumAbout } from '#shared/types/spectrum'

/** Both ends in vacuum nm, null while the axis is not fully known. */
export function wavelengthRange(ends: [number, number], about: SpectrumAbout): { wavelengthFrom: number | null, wavelengthTo: number | null } {
  const axis = Float64Array.from(ends)
  const normal = normaliseSpectrum({ axis, values: axis, sigma: null }, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in normal) return { wavelengthFrom: null, wavelengthTo: null }
  return { wavelengthFrom: normal.wavelength[0]!, wavelengthTo: normal.wavelength[1]! }
}
