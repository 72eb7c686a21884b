import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import type { TableFit } from '../retrieve/fit-table'

/** C2 (E_max - E_min) / T over the used lines that share a scale, the widest such group. */
export function leverArm({ table, fit }: TableFit): number {
  const ranges = new Map<string, [number, number]>()
  for (const line of table.lines) {
    const { termEnergy } = lineStrength(line, table.reading)
    const key = table.bandScales === 'common' ? '' : line.band
    const [low, high] = ranges.get(key) ?? [termEnergy, termEnergy]
    ranges.set(key, [Math.min(low, termEnergy), Math.max(high, termEnergy)])
  }
  let widest = 0
  for (const [low, high] of ranges.values()) widest = Math.max(widest, high - low)
  return C2 * widest * fit.beta
}

/** Signal-to-noise of the weakest used line, signed; null when the noise is not known. */
export function weakestSignalToNoise({ table, varianceFactor }: TableFit): number | null {
  if (!varianceFactor) return null
  let weakest = Infinity
  for (let i = 0; i < table.lines.length; i++) weakest = Math.min(weakest, table.intensity[i] / table.sigma[i])
  return weakest / Math.sqrt(varianceFactor)
}
