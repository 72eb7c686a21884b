import type { ObservableReading } from '../types'
import { nothingMissing } from './component-model'
import type { ObservableModel } from './component-model'

/** Integrated absorbance over wavenumber: w = A g_u / v^2, phi = exp(-C2 E_l/T) (1 - e^{-C2 v/T}). */
export const absorptionArea: ObservableModel = {
  kind: 'stimulated',
  component: line => ({ strength: line.einsteinA * line.gUpper / line.wavenumber ** 2, energy: line.termLower }),
  missing: nothingMissing,
}

/** Optical depth integrated over velocity: w = A g_u / v^3, phi as for `absorptionArea`. */
export const opticalDepthIntegral: ObservableModel = {
  kind: 'stimulated',
  component: line => ({ strength: line.einsteinA * line.gUpper / line.wavenumber ** 3, energy: line.termLower }),
  missing: nothingMissing,
}

/** w = A g_u lambda^n: the power of wavelength by what the width is measured in. */
const powers: Record<NonNullable<ObservableReading['widthIn']>, number> = { wavelength: 4, wavenumber: 2, velocity: 3 }

/** Equivalent width of a weak line: w = A g_u lambda^{4, 2, 3}, phi as for `absorptionArea`. */
export const equivalentWidth: ObservableModel = {
  kind: 'stimulated',
  component: (line, reading) => ({
    strength: line.einsteinA * line.gUpper / line.wavenumber ** powers[reading.widthIn ?? 'wavenumber'],
    energy: line.termLower,
  }),
  missing: reading => reading.widthIn ? null : 'It is not stated whether the equivalent width is in wavelength, wavenumber or velocity.',
}
