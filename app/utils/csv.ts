export type CsvValue = string | number | boolean | null | undefined

/** A text that a spreadsheet would run as a formula is defused by an apostrophe; numbers stay numbers. */
const safe = (text: string): string => /^[=+\-@\t\r]/.test(text) ? `'${text}` : text
const quote = (text: string): string => /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
const cell = (value: CsvValue): string => value == null ? '' : typeof value === 'string' ? quote(safe(value)) : String(value)

/** Rows as CSV (RFC 4180: comma, CRLF, quotes doubled). */
export function toCsv(columns: string[], rows: CsvValue[][]): string {
  return [columns.map(cell), ...rows.map(row => row.map(cell))].map(row => row.join(',')).join('\r\n') + '\r\n'
}
