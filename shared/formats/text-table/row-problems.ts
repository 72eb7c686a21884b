import { FormatError } from '../format-error'
import { cellsOf, isNotFiniteWord, unquote } from './delimiter'
import { maxLineLength } from '../limits'
import type { Layout } from './layout'
import { lineTooLong } from './layout'

/** Why a cell is no finite number, with the line, the column and what to do. Called on the way out only. */
export function cellProblem(row: string, cell: string, line: number, column: number, layout: Layout, decimalMark: string): FormatError {
  if (row.length > maxLineLength) return lineTooLong(line, row.length)
  const count = cellsOf(row, layout.delimiter).length
  const content = unquote(cell).slice(0, 40)
  if (content === '' && count !== layout.columnCount) return raggedRow(row, line, layout)
  const name = layout.names[column]
  const where = `line ${line}, column ${column + 1}${name ? ` (${name.slice(0, 60)})` : ''}`
  const place = `L${where.slice(1)}`
  if (content === '') return new FormatError('not_a_number', `${place} is empty. Fill in the value or remove the row.`, where)
  if (isNotFiniteWord(content) || isHuge(content)) return new FormatError('not_finite', `${place}: "${content}" is not a finite number. Remove the row; pixels without a value can simply be left out.`, where)
  if (/^[+-]?[\d.,]+$/.test(content) && /[.,]/.test(content)) {
    return new FormatError('decimal_comma', `${place}: "${content}" does not agree with the decimal mark of the rows before ("${decimalMark}"). Use one decimal mark throughout and no thousands separators.`, where)
  }
  return new FormatError('not_a_number', `${place}: "${content}" is not a number. Mend the cell or remove the row; put # before a line that is not data.`, where)
}

const isHuge = (content: string) => Math.abs(Number(content)) === Infinity

export function raggedRow(row: string, line: number, layout: Layout): FormatError {
  if (row.length > maxLineLength) return lineTooLong(line, row.length)
  const count = cellsOf(row, layout.delimiter).length
  const hint = layout.delimiter === ',' && count > layout.columnCount ? ' If the file has decimal commas, separate its columns by semicolons or tabs.' : ''
  return new FormatError('ragged_row', `Line ${line} has ${count} ${count === 1 ? 'column' : 'columns'}, while the first row of numbers (line ${layout.dataLine}) has ${layout.columnCount}. Give every row the same columns.${hint}`, `line ${line}`)
}
