import { C2 } from '../constants'
import { lineStrength } from '../line-model/line-strength'
import { lineValue } from '../line-model/line-value'
import type { TableFit } from '../retrieve/fit-table'
import type { LineTable } from '../retrieve/line-table'
import type { CrossCheck } from '../types'

/**
 * Estimator 6 for the observable at hand: the strongest used line of the band with most lines, and the T interval in which the model
 * gives it more than its neighbours in energy; T where the two neighbours would be equal. Numerically, for any observable.
 */
export function strongestLineCheck({ table }: TableFit): CrossCheck | null {
  const ladder = ladderOf(table)
  if (ladder.length < 3) return null
  const k = ladder.reduce((best, i, at) => table.intensity[i] > table.intensity[ladder[best]] ? at : best, 0)
  const below = k > 0 ? equality(table, ladder[k - 1], ladder[k]) : null
  const above = k < ladder.length - 1 ? equality(table, ladder[k], ladder[k + 1]) : null
  const middle = k > 0 && k < ladder.length - 1 ? equality(table, ladder[k - 1], ladder[k + 1]) : null
  return {
    method: 'strongest-line',
    temperature: middle,
    uncertainty: null,
    interval: below !== null && above !== null && below > above ? null : [below, above],
    note: `${table.lines[ladder[k]].label} is the strongest used line; the interval keeps it above its neighbours in energy`,
  }
}

/** Used lines of the fullest band by ascending energy; of lines that share an energy only the strongest counts. */
function ladderOf(table: LineTable): number[] {
  const byBand = new Map<string, number[]>()
  table.lines.forEach((line, i) => byBand.set(line.band, [...byBand.get(line.band) ?? [], i]))
  const fullest = [...byBand.values()].reduce((a, b) => b.length > a.length ? b : a)
  const energy = (i: number) => lineStrength(table.lines[i], table.reading).termEnergy
  const ordered = fullest.sort((a, b) => energy(a) - energy(b) || table.intensity[b] - table.intensity[a])
  return ordered.filter((i, at) => at === 0 || energy(i) > energy(ordered[at - 1]))
}

/** The T at which the model gives two lines (a below b in energy) the same intensity, by halving in ln beta inside the search range; null outside. */
function equality(table: LineTable, a: number, b: number): number | null {
  const { lines, reading } = table
  const reference = lineStrength(lines[a], reading).termEnergy
  const gap = C2 * (lineStrength(lines[b], reading).termEnergy - reference)
  const excess = (beta: number) => {
    const upper = lineValue(lines[b], reading, beta, lineStrength(lines[b], reading).termEnergy).value
    return Math.log(Math.abs(upper / lineValue(lines[a], reading, beta, reference).value)) - beta * gap
  }
  let [hot, cold] = table.betaRange
  if (!(excess(hot) > 0 && excess(cold) < 0)) return null
  for (let i = 0; i < 60; i++) {
    const middle = Math.sqrt(hot * cold)
    if (excess(middle) > 0) hot = middle
    else cold = middle
  }
  return 1 / Math.sqrt(hot * cold)
}
