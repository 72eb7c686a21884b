import type { ObservableModel } from './component-model'

/**
 * Integrated brightness temperature on the Rayleigh-Jeans scale (K km/s), continuum only of T_bg:
 * w = A g_u / v^2, phi = exp(-C2 E_u/T) [1 - (e^{C2 v/T}-1)/(e^{C2 v/Tbg}-1)].
 */
export const brightnessIntegral: ObservableModel = {
  kind: 'background',
  component: line => ({ strength: line.einsteinA * line.gUpper / line.wavenumber ** 2, energy: line.termUpper }),
  missing: reading => reading.backgroundTemperature !== undefined && reading.backgroundTemperature >= 0
    ? null
    : 'The background temperature is not stated (0 K is allowed).',
}
