import { tooManyPixels } from '../check-columns'
import { maxPixels } from '../limits'
import type { Layout } from './layout'
import { lineEnd } from './layout'
import { NumberReader } from './number-reader'
import { cellProblem, raggedRow } from './row-problems'

export interface NumericTable {
  columns: Float64Array[]
  /** 1-based line number in the file of each row. */
  lines: Uint32Array
  /** The decimal mark that was met. */
  decimalMark: '' | '.' | ','
}

const SPACE = 32
const TAB = 9
const QUOTE = 34

/** All rows as numbers, column by column. Goes through the text without cutting it into pieces. */
export function parseRows(text: string, layout: Layout): NumericTable {
  const capacity = countLines(text, layout.dataStart)
  const columns = Array.from({ length: layout.columnCount }, () => new Float64Array(capacity))
  const lines = new Uint32Array(capacity)
  const rowParser = new RowParser(text, layout, columns)
  let rows = 0
  let line = layout.dataLine
  for (let start = layout.dataStart; start < text.length; line++) {
    const end = lineEnd(text, start)
    if (!rowParser.isSkipped(start, end)) {
      if (rows === maxPixels) throw tooManyPixels()
      rowParser.parse(start, end, rows, line)
      lines[rows++] = line
    }
    start = end + 1
  }
  return { columns: columns.map(column => column.subarray(0, rows)), lines: lines.subarray(0, rows), decimalMark: rowParser.reader.decimalMark }
}

function countLines(text: string, start: number): number {
  let count = 0
  for (let at = start; at < text.length && count < maxPixels; at = lineEnd(text, at) + 1) count++
  return count
}

const isSpace = (code: number) => code === SPACE || code === TAB || code === 11 || code === 12 || code === 0xA0

class RowParser {
  readonly reader = new NumberReader()
  private readonly separator: number
  private readonly bySpace: boolean

  constructor(private readonly text: string, private readonly layout: Layout, private readonly columns: Float64Array[]) {
    this.separator = layout.delimiter.charCodeAt(0)
    this.bySpace = layout.delimiter === ' '
  }

  /** Blank lines and comments. A leading ';' is an empty cell where ';' separates. */
  isSkipped(start: number, end: number): boolean {
    let at = start
    while (at < end && isSpace(this.text.charCodeAt(at))) at++
    if (at === end) return true
    const code = this.text.charCodeAt(at)
    return code === 35 || code === 33 || code === 37 || (code === 59 && this.separator !== 59)
  }

  parse(start: number, end: number, row: number, line: number): void {
    const count = this.columns.length
    let column = 0
    let at = start
    while (at <= end) {
      at = this.skipSpace(at, end)
      if (at === end && (this.bySpace || column === count)) break
      const stop = this.cellEnd(at, end)
      if (column === count) throw raggedRow(this.text.slice(start, end), line, this.layout)
      const value = this.readCell(at, stop)
      if (!Number.isFinite(value)) throw cellProblem(this.text.slice(start, end), this.text.slice(at, stop), line, column, this.layout, this.reader.decimalMark)
      this.columns[column++]![row] = value
      at = stop + 1
    }
    if (column < count) throw raggedRow(this.text.slice(start, end), line, this.layout)
  }

  private skipSpace(from: number, end: number): number {
    let at = from
    while (at < end) {
      const code = this.text.charCodeAt(at)
      if (!isSpace(code) || (code === this.separator && !this.bySpace)) break
      at++
    }
    return at
  }

  private cellEnd(from: number, end: number): number {
    let at = from
    if (this.bySpace) {
      while (at < end && !isSpace(this.text.charCodeAt(at))) at++
      return at
    }
    if (this.text.charCodeAt(from) === QUOTE) at = this.closingQuote(from, end)
    while (at < end && this.text.charCodeAt(at) !== this.separator) at++
    return at
  }

  private closingQuote(from: number, end: number): number {
    const close = this.text.indexOf('"', from + 1)
    return close < 0 || close >= end ? from : close
  }

  private readCell(start: number, end: number): number {
    const { text } = this
    let last = end
    while (last > start && isSpace(text.charCodeAt(last - 1))) last--
    const quoted = last - start > 1 && text.charCodeAt(start) === QUOTE && text.charCodeAt(last - 1) === QUOTE
    return quoted ? this.reader.read(text, start + 1, last - 1) : this.reader.read(text, start, last)
  }
}
