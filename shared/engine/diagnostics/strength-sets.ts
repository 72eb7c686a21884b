import { fitTable } from '../retrieve/fit-table'
import type { TableFit } from '../retrieve/fit-table'
import type { LineTable } from '../retrieve/line-table'
import { strengthProblem } from '../line-model/line-strength'
import type { AlternativeStrengths, MeasuredLine, RetrievalResult, UncertaintyComponent } from '../types'

type StrengthSets = RetrievalResult['strengthSets']

/**
 * T with the set in use and with every other one, from the same lines. A set that lacks a used line has no temperature.
 *
 * @param used indices of the used lines in the input, whose order the alternatives follow
 */
export function strengthSetTemperatures(fitted: TableFit, name: string, alternatives: readonly AlternativeStrengths[], used: readonly number[]): StrengthSets {
  const own = { name, temperature: fitted.temperature, uNoise: fitted.uTemperature }
  const others = alternatives.filter(set => set.name !== name).map((set) => {
    const table = withStrengths(fitted.table, used.map(i => set.einsteinA[i] ?? null))
    const other = table && fitTable(table)
    return { name: set.name, temperature: other?.temperature ?? null, uNoise: other?.uTemperature ?? null, ...(set.comparisonOnly ? { comparisonOnly: true } : {}) }
  })
  return [own, ...others]
}

function withStrengths(table: LineTable, strengths: readonly (number[] | null)[]): LineTable | null {
  const lines: MeasuredLine[] = []
  for (let i = 0; i < table.lines.length; i++) {
    const rates = strengths[i]
    const line = table.lines[i]
    if (!rates || rates.length !== line.components.length) return null
    const swapped = { ...line, components: line.components.map((component, c) => ({ ...component, einsteinA: rates[c] })) }
    if (strengthProblem(swapped, table.reading)) return null
    lines.push(swapped)
  }
  return { ...table, lines }
}

/** Systematic part from the choice of strength set: the standard deviation (n - 1) of T over the complete sets, those for comparison only left out; null for one set. */
export function strengthSetComponent(sets: StrengthSets): UncertaintyComponent | null {
  const values = sets.flatMap(set => set.comparisonOnly ? [] : set.temperature ?? [])
  if (values.length < 2) return null
  const mean = values.reduce((a, b) => a + b, 0) / values.length
  const squares = values.reduce((a, b) => a + (b - mean) ** 2, 0)
  return { name: 'strength set', kelvin: Math.sqrt(squares / (values.length - 1)), commonTo: 'all' }
}

/** Largest distance of another set's T from the one in use, K; sets for comparison only do not count. */
export function strengthSetDistance(sets: StrengthSets): number {
  const own = sets[0]?.temperature
  if (own === null || own === undefined) return 0
  return sets.reduce((largest, { temperature, comparisonOnly }) => temperature === null || comparisonOnly ? largest : Math.max(largest, Math.abs(temperature - own)), 0)
}
