import type { ObservableModel } from './component-model'

/** Level populations N_i (w = g_i) or N_i/g_i (w = 1); E_i and g_i are `termUpper` and `gUpper`. */
export const levelPopulation: ObservableModel = {
  kind: 'plain',
  component: (line, reading) => ({ strength: reading.populationPer === 'state' ? 1 : line.gUpper, energy: line.termUpper }),
  missing: reading => reading.populationPer ? null : 'It is not stated whether populations are per level or per state.',
}
