import type { LineComponent, LineRetrievalInput, NoiseKind, ObservableReading } from '#shared/engine/types'
import { rotorLines, syntheticInput, tableModel } from './tables'

export interface TwoGases {
  reading?: ObservableReading
  lines?: { label: string, band: string, components: LineComponent[] }[]
  cold?: number
  hot?: number
  /** Intensity of the hot gas over that of the cold one, summed over the lines. */
  share?: number
  /** Standard uncertainty of every line as a part of the strongest one. */
  noise?: number
  normal?: () => number
  kind?: NoiseKind
  draws?: number
  seed?: number
}

/** Lines of a cold and a hot gas, with the model written out from its formulas. */
export function twoGases({ reading = { observable: 'photon-emission' }, lines = rotorLines(10, 1.93), cold = 30, hot = 200, share = 0.5, noise = 0.01, normal, kind = 'absolute', draws = 99, seed = 1 }: TwoGases = {}): LineRetrievalInput {
  const of = (T: number) => lines.map(line => line.components.reduce((sum, component) => sum + tableModel(reading, component, T), 0))
  const total = (values: number[]) => values.reduce((sum, value) => sum + value, 0)
  const [a, b] = [of(cold), of(hot)]
  const exact = a.map((value, i) => value / total(a) + share * b[i] / total(b))
  const sigma = noise * Math.max(...exact.map(Math.abs))
  const input = syntheticInput({ reading, temperature: cold, lines, sigma })
  return {
    ...input,
    lines: input.lines.map((line, i) => ({ ...line, intensity: exact[i] + (normal ? sigma * normal() : 0), sigma })),
    noise: kind,
    twoTemperatures: { draws, seed },
  }
}
