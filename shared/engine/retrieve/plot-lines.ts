import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import type { PlotLine } from '../types'
import type { TableFit } from './fit-table'

/** The fitted model as straight lines of the Boltzmann plot, one per band; a band whose scale is zero has none. */
export function plotLines({ table, fit, bands, profile }: TableFit): PlotLine[] {
  const { referenceEnergy } = profile.problem.model
  return [...new Set(table.lines.map(line => line.band))].flatMap((band) => {
    const scale = fit.scales[table.bandScales === 'common' ? 0 : bands.indexOf(band)]
    // ln s refers to energies above the lowest used one.
    const intercept = Math.log(scale) + fit.beta * C2 * referenceEnergy
    if (!Number.isFinite(intercept)) return []
    const energies = table.lines.filter(line => line.band === band).map(line => lineStrength(line, table.reading).termEnergy)
    const energyRange: [number, number] = [Math.min(...energies), Math.max(...energies)]
    return [{ band, intercept, slope: -fit.beta * C2, energyRange }]
  })
}
