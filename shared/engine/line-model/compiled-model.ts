import { C2 } from '../constants'
import type { ModelLine, ObservableReading } from '../types'
import type { FactorKind } from './component-model'
import { observableModels } from './observable-models'

/**
 * Lines of one observable as flat arrays, ready for evaluation at many temperatures.
 * Components of line i are starts[i] .. starts[i+1]-1.
 */
export interface CompiledModel {
  kind: FactorKind
  lineCount: number
  starts: Int32Array
  /** w / strengthUnit per component. */
  amplitude: Float64Array
  /** C2 (E - referenceEnergy) per component, K; never negative. */
  energy: Float64Array
  /** C2 v per component, K. */
  photon: Float64Array
  /** 1/T_bg, 1/K; Infinity for T_bg = 0. Only `background` reads it. */
  backgroundBeta: number
  /** Smallest energy - photon, K: the guard of `background` below T_bg. */
  lowestBelow: number
  /** Largest w: keeps amplitudes near 1. */
  strengthUnit: number
  /** Lowest energy of these lines, cm^-1. */
  referenceEnergy: number
}

/**
 * Compiles lines for the observable of `reading`. Lines must have finite, positive strengths (see `isUsableLine`).
 * The lowest energy is subtracted so that no exponential overflows.
 */
export function compileModel(lines: readonly ModelLine[], reading: ObservableReading): CompiledModel {
  const observable = observableModels[reading.observable]
  const starts = new Int32Array(lines.length + 1)
  for (let i = 0; i < lines.length; i++) starts[i + 1] = starts[i] + lines[i].components.length
  const count = starts[lines.length]
  const amplitude = new Float64Array(count)
  const energy = new Float64Array(count)
  const photon = new Float64Array(count)
  let c = 0
  for (const line of lines) {
    for (const component of line.components) {
      const model = observable.component(component, reading)
      amplitude[c] = model.strength
      energy[c] = model.energy
      photon[c] = C2 * component.wavenumber
      c++
    }
  }
  const strengthUnit = amplitude.reduce((a, b) => Math.max(a, b), 0) || 1
  const referenceEnergy = energy.reduce((a, b) => Math.min(a, b), Infinity)
  let lowestBelow = Infinity
  for (c = 0; c < count; c++) {
    amplitude[c] /= strengthUnit
    energy[c] = C2 * (energy[c] - referenceEnergy)
    lowestBelow = Math.min(lowestBelow, energy[c] - photon[c])
  }
  const backgroundBeta = 1 / (reading.backgroundTemperature ?? 0)
  return { kind: observable.kind, lineCount: lines.length, starts, amplitude, energy, photon, backgroundBeta, lowestBelow, strengthUnit, referenceEnergy }
}
