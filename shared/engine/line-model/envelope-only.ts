import { nothingMissing } from './component-model'
import type { ObservableModel } from './component-model'

/**
 * Quick look with transition probabilities taken equal (common practice, no source): w = g and phi = exp(-C2 E/T) of the initial level:
 * the upper one, except for a Stokes Raman line.
 */
export const envelopeOnly: ObservableModel = {
  kind: 'plain',
  component: line => line.raman?.branch === 'stokes'
    ? { strength: line.gLower, energy: line.termLower }
    : { strength: line.gUpper, energy: line.termUpper },
  missing: nothingMissing,
}
