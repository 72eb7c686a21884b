import type { LineComponent } from '../types'
import type { ObservableModel } from './component-model'

/**
 * Pure-rotational Raman line from initial level J: w = g_I X(J) v_s^3 (photons) or v_s^4 (energy);
 * Stokes X = (J+1)(J+2)/(2J+3), anti-Stokes X = J(J-1)/(2J-1); phi = exp(-C2 E_initial/T).
 * The initial level is the lower one of a Stokes line, the upper one of an anti-Stokes line.
 */
export const ramanScatter: ObservableModel = {
  kind: 'plain',
  component: (line, reading) => {
    if (!line.raman) return { strength: Number.NaN, energy: Number.NaN }
    const power = reading.signalIn === 'energy' ? 4 : 3
    const strength = line.raman.spinWeight * placzekTeller(line.raman) * line.raman.scatteredWavenumber ** power
    return { strength, energy: line.raman.branch === 'stokes' ? line.termLower : line.termUpper }
  },
  missing: reading => reading.signalIn ? null : 'It is not stated whether the Raman signal counts photons or energy.',
}

/** Placzek-Teller factor times 2J+1, without the common 3/2. */
function placzekTeller({ J, branch }: NonNullable<LineComponent['raman']>): number {
  return branch === 'stokes' ? (J + 1) * (J + 2) / (2 * J + 3) : J * (J - 1) / (2 * J - 1)
}
