import type { SpectrumAbout } from '../../types/spectrum'
import { firstBadSigma, firstUnorderedRow } from '../check-columns'
import { FormatError } from '../format-error'
import type { ColumnHeading } from './column-names'
import { guessColumns } from './column-names'

export type Columns = NonNullable<SpectrumAbout['columns']>
export interface ColumnChoice {
  columns: Columns
  /** False: only a proposal, which a person must confirm. */
  certain: boolean
}

/** What the person says; else what the names say; else two columns are axis and values; else a proposal. */
export function chooseColumns(table: Float64Array[], headings: ColumnHeading[], said: Columns | null | undefined): ColumnChoice {
  if (said) return { columns: checkSaid(said, table.length), certain: true }
  const { axis, values, sigma } = guessColumns(headings)
  if (axis !== null && values !== null) return { columns: { axis, values, sigma }, certain: true }
  if (table.length === 2 && headings.length === 0) return { columns: { axis: 0, values: 1, sigma: null }, certain: true }
  return { columns: propose(table, axis), certain: table.length === 2 && axis !== null }
}

function propose(table: Float64Array[], namedAxis: number | null): Columns {
  const ordered = table.findIndex(column => firstUnorderedRow(column) < 0)
  const axis = namedAxis ?? Math.max(ordered, 0)
  const [values, sigma] = table.map((_, index) => index).filter(index => index !== axis)
  const sigmaFits = table.length === 3 && firstBadSigma(table[sigma!]!) < 0
  return { axis, values: values!, sigma: sigmaFits ? sigma! : null }
}

function checkSaid(columns: Columns, count: number): Columns {
  const chosen = [columns.axis, columns.values, ...(columns.sigma === null ? [] : [columns.sigma])]
  const outside = chosen.find(column => !Number.isInteger(column) || column < 0 || column >= count)
  if (outside !== undefined) throw new FormatError('columns', `Column ${outside + 1} was chosen, but the file has ${count} columns.`)
  if (new Set(chosen).size < chosen.length) throw new FormatError('columns', 'Axis, values and sigma must be different columns.')
  return columns
}
