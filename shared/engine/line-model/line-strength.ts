import type { ModelLine, ObservableReading } from '../types'
import { observableModels } from './observable-models'

/** What the Boltzmann plot needs of a line. */
export interface LineStrength {
  /** Sum of w over components; NaN when the line lacks data. */
  strength: number
  /** Strength-weighted mean energy, cm^-1. */
  termEnergy: number
  /** Plain mean vacuum wavenumber, cm^-1. */
  wavenumber: number
}

/** Strength, energy and place of a line under the observable of `reading`. */
export function lineStrength(line: ModelLine, reading: ObservableReading): LineStrength {
  const observable = observableModels[reading.observable]
  let strength = 0
  let weighted = 0
  let plainEnergy = 0
  let wavenumber = 0
  for (const component of line.components) {
    const model = observable.component(component, reading)
    strength += model.strength
    weighted += model.strength * model.energy
    plainEnergy += model.energy
    wavenumber += component.wavenumber
  }
  const count = line.components.length
  return { strength, termEnergy: strength > 0 ? weighted / strength : plainEnergy / count, wavenumber: wavenumber / count }
}

/** Why the model cannot use a line, in words; null when it can. */
export function strengthProblem(line: ModelLine, reading: ObservableReading): string | null {
  if (line.components.length === 0) return 'the line has no component'
  const observable = observableModels[reading.observable]
  if (reading.observable === 'raman-scatter' && line.components.some(c => !c.raman)) return 'the Raman data of the line are missing'
  let strength = 0
  for (const component of line.components) {
    const model = observable.component(component, reading)
    if (!Number.isFinite(model.energy)) return 'the term energy of the line is not a number'
    if (!Number.isFinite(model.strength) || model.strength < 0) return 'the strength of the line is not a positive number'
    if (observable.kind !== 'plain' && !(component.wavenumber > 0 && component.wavenumber < Infinity)) return 'the wavenumber of the line is not a positive number'
    strength += model.strength
  }
  return strength > 0 && Number.isFinite(strength) ? null : 'the model gives the line no strength'
}
