import { FormatError } from '../format-error'
import { maxColumns, maxLineLength } from '../limits'
import type { Delimiter } from './delimiter'
import { cellsOf, chooseDelimiter, isNumberCell, startsWithNumber } from './delimiter'
import type { Names } from './header'
import { findNames } from './header'

/** How the rows of a text table stand, found from everything up to the first row of numbers. */
export interface Layout extends Names {
  delimiter: Delimiter
  columnCount: number
  /** Offset and 1-based line number of the first row of numbers. */
  dataStart: number
  dataLine: number
}

const maxPreamble = 1000
/** Names stand close to the numbers. */
const keptComments = 200
const commentMark = /^[#!%;]+\s*/

export function findLayout(text: string): Layout {
  const preamble: { line: number, text: string }[] = []
  const comments: string[] = []
  let start = 0
  for (let line = 1; start < text.length && preamble.length <= maxPreamble; line++) {
    const end = lineEnd(text, start)
    const content = text.slice(start, end).trim()
    if (commentMark.test(content)) keepComment(comments, content)
    else if (content.length > maxLineLength) throw lineTooLong(line, content.length)
    else if (startsWithNumber(content)) return layoutFrom(content, preamble, comments, start, line)
    else if (content) preamble.push({ line, text: content })
    start = end + 1
  }
  throw new FormatError('no_numbers', 'No row of numbers was found. A spectrum is a text table with one row per pixel: axis, value and, if known, sigma.')
}

function keepComment(comments: string[], content: string): void {
  if (content.length <= maxLineLength) comments.push(content.replace(commentMark, ''))
  if (comments.length > keptComments) comments.shift()
}

export const lineTooLong = (line: number, length: number) =>
  new FormatError('line_too_long', `Line ${line} has ${length.toLocaleString('en')} characters. A spectrum is a text table with one row per pixel: put each pixel on a line of its own.`, `line ${line}`)

export function lineEnd(text: string, start: number): number {
  const end = text.indexOf('\n', start)
  return end < 0 ? text.length : end
}

function layoutFrom(row: string, preamble: { line: number, text: string }[], comments: string[], dataStart: number, dataLine: number): Layout {
  const delimiter = chooseDelimiter(row)
  const cells = cellsOf(row, delimiter)
  const columnCount = cells.length
  if (columnCount < 2) throw new FormatError('columns', `Line ${dataLine} has one column. A spectrum needs at least two: axis and values.`, `line ${dataLine}`)
  if (columnCount > maxColumns) throw new FormatError('too_many_columns', `Line ${dataLine} has ${columnCount} columns; at most ${maxColumns} are read.`, `line ${dataLine}`)
  const names = findNames(preamble, comments, delimiter, columnCount)
  refuseAmbiguousCommas(cells, delimiter, names.names.length, dataLine)
  return { delimiter, columnCount, dataStart, dataLine, ...names }
}

/** "500,1,812,4" may be four whole numbers or two with decimal commas; only as many names as cells decide it. */
function refuseAmbiguousCommas(cells: string[], delimiter: Delimiter, nameCount: number, line: number): void {
  if (delimiter !== ',' || cells.length < 4 || cells.length % 2 || nameCount === cells.length) return
  if (!cells.every(cell => isNumberCell(cell) && /^[+-]?\d+$/.test(cell))) return
  throw new FormatError('decimal_comma', `Line ${line} cannot be read safely: its commas may separate columns or be decimal marks. Use decimal points, or separate the columns by semicolons or tabs.`, `line ${line}`)
}
