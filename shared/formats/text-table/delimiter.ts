/** ' ' stands for any run of spaces and tabs. */
export type Delimiter = ' ' | ',' | ';' | '\t'

const numberCell = /^[+-]?(\d+\.?\d*|\d+,\d+|\.\d+)([eEdD][+-]?\d+)?$/
const notFinite = /^[+-]?(nan|inf|infinity)$/i

export const isNotFiniteWord = (cell: string) => notFinite.test(cell)
export const isNumberCell = (cell: string) => numberCell.test(cell) || notFinite.test(cell)

export function startsWithNumber(line: string): boolean {
  const first = /^"?([^\s,;"]+)/.exec(line)?.[1]
  return first !== undefined && isNumberCell(first)
}

/** The separator of a table, by its first row of numbers. A comma is a decimal mark only where something else separates. */
export function chooseDelimiter(row: string): Delimiter {
  if (row.includes(';')) return ';'
  for (const delimiter of ['\t', ' ', ','] as const) {
    const cells = cellsOf(row, delimiter)
    if (cells.length > 1 && cells.every(isNumberCell)) return delimiter
  }
  return row.includes('\t') ? '\t' : row.includes(',') ? ',' : ' '
}

/** The cells of one line, trimmed, without quotes and without the empty cell that a trailing separator makes. */
export function cellsOf(line: string, delimiter: Delimiter): string[] {
  if (delimiter === ' ') return line.trim().split(/\s+/)
  const cells = (delimiter + line).match(cellForms[delimiter])!.map(cell => unquote(cell.slice(1)))
  if (cells.length > 1 && cells.at(-1) === '') cells.pop()
  return cells
}

export const unquote = (cell: string) => cell.trim().replace(/^"(.*)"$/, '$1').trim()

const cellForms = { ',': cellForm(','), ';': cellForm(';'), '\t': cellForm('\t') }

/** A separator and what follows it, quoted or not. */
function cellForm(separator: string): RegExp {
  return new RegExp(`${separator} *"[^"]*" *(?=${separator}|$)|${separator}[^${separator}]*`, 'g')
}
