import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import { lineValue } from '../line-model/line-value'
import type { LineTable } from '../retrieve/line-table'
import { hollowSigmas } from '../thresholds'

/** A point of the Boltzmann plot that enters its straight line. */
export interface PlotPoint {
  band: string
  /** C2 E, K */
  energy: number
  /** ln(I / w) */
  y: number
  /** Standard uncertainty of y. */
  sigma: number
}

/**
 * Points of the lines with I > 3 sigma. For observables whose phi is more than exp(-C2 E/T), the rest of phi is taken at `beta`.
 *
 * @param noiseFactor from the table's sigmas to real ones
 */
export function plotPoints(table: LineTable, beta: number, noiseFactor: number): PlotPoint[] {
  return table.lines.flatMap((line, i) => {
    const { strength, termEnergy } = lineStrength(line, table.reading)
    const sigma = table.sigma[i] * noiseFactor
    const w = beta > 0 ? lineValue(line, table.reading, beta, termEnergy).value : strength
    const ratio = table.intensity[i] / w
    if (!(Math.abs(table.intensity[i]) > hollowSigmas * sigma) || !(ratio > 0 && ratio < Infinity)) return []
    return { band: table.bandScales === 'common' ? 'all' : line.band, energy: C2 * termEnergy, y: Math.log(ratio), sigma: Math.abs(sigma / table.intensity[i]) }
  })
}
