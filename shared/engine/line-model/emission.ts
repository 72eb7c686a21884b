import { nothingMissing } from './component-model'
import type { ObservableModel } from './component-model'

/** Optically thin emission counted in photons: w = A g_u, phi = exp(-C2 E_u/T). */
export const photonEmission: ObservableModel = {
  kind: 'plain',
  component: line => ({ strength: line.einsteinA * line.gUpper, energy: line.termUpper }),
  missing: nothingMissing,
}

/** Optically thin emission in energy units: w = A g_u v, phi = exp(-C2 E_u/T). */
export const energyEmission: ObservableModel = {
  kind: 'plain',
  component: line => ({ strength: line.einsteinA * line.gUpper * line.wavenumber, energy: line.termUpper }),
  missing: nothingMissing,
}
