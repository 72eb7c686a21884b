import type { LineComponent, ObservableReading } from '../types'

/**
 * How phi(T) depends on temperature beyond the Boltzmann factor exp(-C2 E/T):
 * `plain`: not at all; `stimulated`: times (1 - e^{-C2 v/T}); `background`: times [1 - (e^{C2 v/T}-1)/(e^{C2 v/Tbg}-1)].
 */
export type FactorKind = 'plain' | 'stimulated' | 'background'

/** The model of one component: intensity = scale x strength x phi(T). */
export interface ComponentModel {
  /** w, T-independent; unit by observable. */
  strength: number
  /** Term energy in the Boltzmann factor, cm^-1. */
  energy: number
}

/** One observable: its component model, its factor and what it must be told. */
export interface ObservableModel {
  kind: FactorKind
  component: (component: LineComponent, reading: ObservableReading) => ComponentModel
  /** What is missing from the reading, in words; null when it is complete. */
  missing: (reading: ObservableReading) => string | null
}

export const nothingMissing = (): null => null
