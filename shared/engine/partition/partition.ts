import { C2 } from '../constants'
import { truncatedPartition } from '../thresholds'
import type { FlagName } from '../types'

export interface Level { energy: number, degeneracy: number }

export interface PartitionValue {
  /** Q(T); null when it cannot be said. */
  value: number | null
  /** Estimated part of Q that the levels hold, 0..1; null for a table. */
  held: number | null
  flags: FlagName[]
}

/**
 * Part of the sum that lies above the last level, relative to the sum. The levels beyond are taken to go on like those of a rotor:
 * with E ~ J^2 and g ~ J the sum is an integral over E, whose tail is (kT / C2) rho(E_top) exp(-C2 E_top / T), rho = g / dE at the top.
 */
function missingPart(levels: readonly Level[], temperature: number, sum: number, lowest: number): number {
  if (levels.length < 2) return 0
  const sorted = [...levels].sort((a, b) => a.energy - b.energy)
  const top = sorted[sorted.length - 1]
  const window = sorted.slice(-Math.min(5, sorted.length))
  const span = top.energy - window[0].energy
  if (!(span > 0)) return 0
  const density = window.slice(1).reduce((total, level) => total + level.degeneracy, 0) / span
  // The sum ends half a level spacing above the top level.
  const edge = top.energy + span / (window.length - 1) / 2
  return density * temperature / C2 * Math.exp(-C2 * (edge - lowest) / temperature) / sum
}

/** Q(T) = sum g exp(-C2 E / T) over levels (energies cm^-1 from the list's zero). `q-truncated` when more than 1 % of it is estimated to be missing. */
export function partitionFromLevels(levels: readonly Level[], temperature: number): PartitionValue {
  if (levels.length === 0 || !(temperature > 0) || temperature === Infinity) return { value: null, held: null, flags: [] }
  const lowest = levels.reduce((low, level) => Math.min(low, level.energy), Infinity)
  const sum = levels.reduce((total, level) => total + level.degeneracy * Math.exp(-C2 * (level.energy - lowest) / temperature), 0)
  const missing = missingPart(levels, temperature, sum, lowest)
  const value = sum * Math.exp(-C2 * lowest / temperature)
  return { value, held: 1 / (1 + missing), flags: missing / (1 + missing) > truncatedPartition ? ['q-truncated'] : [] }
}

export interface PartitionTable { temperature: readonly number[], value: readonly number[] }

/** Q(T) from a table (temperatures rising) by straight lines in log-log; outside it the end segments go on and `q-extrapolated` is raised. */
export function partitionFromTable(table: PartitionTable, temperature: number): PartitionValue {
  const { temperature: T, value: Q } = table
  if (T.length < 2 || T.length !== Q.length || !(temperature > 0) || temperature === Infinity) return { value: null, held: null, flags: [] }
  const outside = temperature < T[0] || temperature > T[T.length - 1]
  const above = T.findIndex(t => t > temperature)
  const i = Math.max(1, above === -1 ? T.length - 1 : above)
  const slope = Math.log(Q[i] / Q[i - 1]) / Math.log(T[i] / T[i - 1])
  return { value: Q[i - 1] * (temperature / T[i - 1]) ** slope, held: null, flags: outside ? ['q-extrapolated'] : [] }
}
