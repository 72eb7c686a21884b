import { lineStrength } from '../line-model/line-strength'
import type { TableFit } from '../retrieve/fit-table'
import type { CrossCheck } from '../types'
import { twoLineTemperature } from './two-lines'

/** Above this many lines only the lowest and the highest of each band are paired. */
const allPairsLines = 40

/** The pair of used lines of one scale whose ratio is forecast to give the smallest uncertainty, and its temperature; null without such a pair. */
export function twoLineCheck(fitted: TableFit): CrossCheck | null {
  const pair = bestPair(fitted)
  if (!pair) return null
  const { table, varianceFactor, fit } = fitted
  const solved = twoLineTemperature(table, pair[0], pair[1], Math.sqrt(varianceFactor ?? 0), fit.beta)
  return {
    method: 'two-line-ratio',
    temperature: solved?.temperature ?? null,
    uncertainty: varianceFactor === null ? null : solved?.uncertainty ?? null,
    interval: null,
    note: `${table.lines[pair[0]].label} and ${table.lines[pair[1]].label}${solved ? '' : ': their ratio has no temperature'}`,
  }
}

/** Largest energy difference over the noise of the logarithm of the ratio; chosen from sizes, not from the resulting T. */
function bestPair({ table }: TableFit): [number, number] | null {
  const energies = table.lines.map(line => lineStrength(line, table.reading).termEnergy)
  const order = energies.map((_, i) => i).sort((a, b) => energies[a] - energies[b])
  const lines = order.length <= allPairsLines ? order : [...order.slice(0, allPairsLines / 2), ...order.slice(-allPairsLines / 2)]
  const noise = (i: number) => (table.sigma[i] / table.intensity[i]) ** 2
  let best: [number, number] | null = null
  let largest = 0
  for (const [at, i] of lines.entries()) {
    for (const j of lines.slice(at + 1)) {
      if (table.bandScales === 'own' && table.lines[i].band !== table.lines[j].band) continue
      const merit = (energies[j] - energies[i]) / Math.sqrt(noise(i) + noise(j))
      if (merit > largest) {
        largest = merit
        best = [i, j]
      }
    }
  }
  return best
}
