export type CsvCell = string | number | boolean | Date | null | undefined

/** One CSV row with its line end (RFC 4180). Numbers stay numbers in full precision; null, NaN and Infinity are empty. */
export function csvRow(cells: readonly CsvCell[]): string {
  return `${cells.map(csvCell).join(',')}\r\n`
}

/** The rows of a table one by one, for a stream. */
export async function* csvRows(heading: readonly string[], rows: Iterable<readonly CsvCell[]> | AsyncIterable<readonly CsvCell[]>): AsyncGenerator<string> {
  yield csvRow(heading)
  for await (const row of rows) yield csvRow(row)
}

function csvCell(cell: CsvCell): string {
  if (cell === null || cell === undefined) return ''
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : ''
  if (cell instanceof Date) return cell.toISOString()
  if (typeof cell === 'boolean') return String(cell)
  const safe = disarm(cell)
  return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe
}

/** A spreadsheet runs text that begins like a formula; an apostrophe in front makes it text. */
const disarm = (text: string) => /^\s*[=+\-@\t\r＝＋－＠]/.test(text) ? `'${text}` : text
