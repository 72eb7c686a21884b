import { FormatError } from '../format-error'
import { maxNameLength } from '../limits'
import { axisUnitOf } from '../units'
import { guessColumns, parseHeading } from './column-names'
import type { Delimiter } from './delimiter'
import { cellsOf, isNumberCell } from './delimiter'

export interface Names {
  /** One per column, or none at all. */
  names: string[]
  warnings: string[]
}
interface PreambleLine { line: number, text: string }

/** Column names: the last line before the numbers, with a line of units below it if there is one, else a comment line that names them. */
export function findNames(preamble: PreambleLine[], comments: string[], delimiter: Delimiter, columnCount: number): Names {
  const last = preamble.at(-1)
  if (!last) return { names: namesFromComments(comments, delimiter, columnCount), warnings: [] }
  const names = splitNames(last.text, delimiter, columnCount)
  if (!names) {
    refuseOtherWidth(last, delimiter, columnCount)
    return { names: namesFromComments(comments, delimiter, columnCount), warnings: [skipped(preamble.length)] }
  }
  refuseNumbers(names, last.line)
  const above = isUnitRow(names) ? splitNames(preamble.at(-2)?.text ?? '', delimiter, columnCount) : null
  const used = above ? 2 : 1
  return {
    names: above ? above.map((name, index) => withUnit(name, names[index]!)) : names,
    warnings: preamble.length > used ? [skipped(preamble.length - used)] : [],
  }
}

const skipped = (count: number) => `${count} ${count === 1 ? 'line' : 'lines'} of text before the table ${count === 1 ? 'was' : 'were'} skipped.`

/** Names in a line, if they are as many as the columns. Spaces may separate names while brackets hold spaces. */
function splitNames(line: string, delimiter: Delimiter, columnCount: number): string[] | null {
  const ways = [
    () => delimiter === ' ' ? spacedNames(line) : cellsOf(line, delimiter),
    () => cellsOf(line, ','),
    () => line.split(/\s{2,}|\t/),
    () => spacedNames(line),
  ]
  for (const split of ways) {
    const names = split().map(name => name.trim().slice(0, maxNameLength))
    if (names.length === columnCount) return names
  }
  return null
}

const spacedNames = (line: string) => line.replace(/\s+/g, ' ').replace(/ (?=[([{])/g, '').match(/(?:[^\s([{]|\([^)]*\)|\[[^\]]*\]|\{[^}]*\})+/g) ?? []

function namesFromComments(comments: string[], delimiter: Delimiter, columnCount: number): string[] {
  for (const comment of comments.toReversed()) {
    const names = splitNames(comment, delimiter, columnCount)
    if (names && !names.some(isNumberCell) && guessColumns(names.map(parseHeading)).axis !== null) return names
  }
  return []
}

function refuseNumbers(names: string[], line: number): void {
  const column = names.findIndex(isNumberCell)
  if (column < 0) return
  const text = names.findIndex(name => !isNumberCell(name))
  throw new FormatError('not_a_number', `Line ${line}, column ${text + 1}: "${names[text]!.slice(0, 40)}" is not a number, while "${names[column]}" beside it is. Mend the row, or put # before a line that is not data.`, `line ${line}, column ${text + 1}`)
}

/** A heading that clearly names an axis, but not as many columns as the rows have. */
function refuseOtherWidth(last: PreambleLine, delimiter: Delimiter, columnCount: number): void {
  const names = delimiter === ' ' ? spacedNames(last.text) : cellsOf(last.text, delimiter)
  if (names.length < 2 || guessColumns(names.map(parseHeading)).axis === null) return
  if (delimiter === ',' && columnCount === 2 * names.length) {
    throw new FormatError('decimal_comma', `The heading (line ${last.line}) names ${names.length} columns and the rows have ${columnCount}: the commas seem to be both separators and decimal marks. Use decimal points, or separate the columns by semicolons or tabs.`, `line ${last.line}`)
  }
  throw new FormatError('ragged_row', `The heading (line ${last.line}) names ${names.length} columns, but the first row of numbers has ${columnCount}. Give every column a name, or remove the heading.`, `line ${last.line}`)
}

const bare = (cell: string) => cell.replace(/^[([{]\s*(.*?)\s*[)\]}]$/, '$1')
const isUnitRow = (cells: string[]) => cells.some(cell => axisUnitOf(bare(cell)) !== null && axisUnitOf(bare(cell)) !== 'pixel')
const withUnit = (name: string, unit: string) => unit && !/[([{]/.test(name) ? `${name} (${bare(unit)})` : name
