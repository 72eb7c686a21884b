import type { TableLine } from '../../schemas/line-table'
import { tableLineSchema } from '../../schemas/line-table'
import type { Delimiter } from '../text-table/delimiter'
import { cellsOf } from '../text-table/delimiter'
import type { LineField } from './columns'
import { fieldOf, textFields } from './columns'

/** `row`: 1-based line of the pasted text. */
export interface LineTableProblem { row: number, field?: string, message: string }
export type LineTableReading = { ok: true, lines: TableLine[], warnings: string[] } | { ok: false, problems: LineTableProblem[] }

const maxLines = 2000
const maxProblems = 50
type Row = { number: number, text: string }

/** A pasted line table: a heading (label, intensity, sigma, ...) and one line per row. Says what is wrong row by row; never throws. */
export function readLineTable(text: string): LineTableReading {
  const rows = text.replace(/^\uFEFF/, '').split(/\r\n?|\n/).map((row, index) => ({ number: index + 1, text: row.trim() })).filter(row => row.text && !/^[#!%]/.test(row.text))
  const first = rows[0]
  if (!first) return { ok: false, problems: [{ row: 1, message: 'The table is empty. Paste a heading (label, intensity, sigma) and one row per line.' }] }
  if (rows.length > maxLines + 1) return { ok: false, problems: [{ row: rows[maxLines + 1]!.number, message: `A table takes at most ${maxLines} lines.` }] }
  const delimiter = delimiterOf(first.text)
  const heading = readHeading(first, delimiter)
  if ('problems' in heading) return { ok: false, problems: heading.problems }
  return readRows(heading.named ? rows.slice(1) : rows, heading.fields, delimiter, heading.warnings)
}

const delimiterOf = (row: string): Delimiter => ([';', '\t', ','] as const).find(mark => row.includes(mark)) ?? ' '

type Heading = { fields: LineField[], named: boolean, warnings: string[] } | { problems: LineTableProblem[] }

function readHeading(first: Row, delimiter: Delimiter): Heading {
  const cells = delimiter === ' ' ? first.text.replace(/\s+(?=[([][^)\]]*[)\]](\s|$))/g, '').split(/\s+/) : cellsOf(first.text, delimiter)
  if (cells.length > 1 && Number.isFinite(numberOf(cells[1]!, delimiter))) return withoutHeading(first, cells)
  const readings = cells.map(fieldOf)
  const problems = readings.flatMap(reading => 'problem' in reading ? [{ row: first.number, message: reading.problem }] : [])
  const fields = readings.flatMap(reading => 'field' in reading ? [reading.field] : [])
  const twice = fields.find((field, index) => fields.indexOf(field) !== index)
  if (twice) problems.push({ row: first.number, message: `Two columns are ${twice}.` })
  for (const needed of ['label', 'intensity'] as const) if (!problems.length && !fields.includes(needed)) problems.push({ row: first.number, message: `The heading has no column ${needed}.` })
  return problems.length ? { problems } : { fields, named: true, warnings: [] }
}

function withoutHeading(first: Row, cells: string[]): Heading {
  if (cells.length > 3) return { problems: [{ row: first.number, message: `A table with ${cells.length} columns needs a heading that names them, for example: label, intensity, sigma, wavenumber, termUpper, gUpper, A.` }] }
  const fields: LineField[] = cells.length === 3 ? ['label', 'intensity', 'sigma'] : ['label', 'intensity']
  return { fields, named: false, warnings: [`The table has no heading; its columns were read as ${fields.join(', ')}.`] }
}

function readRows(rows: Row[], fields: LineField[], delimiter: Delimiter, warnings: string[]): LineTableReading {
  const problems: LineTableProblem[] = []
  const lines: TableLine[] = []
  const seen = new Map<string, number>()
  for (const row of rows) {
    const read = readRow(row, fields, delimiter)
    if ('problems' in read) problems.push(...read.problems)
    else {
      const key = `${read.line.band ?? ''} ${read.line.label}`
      const earlier = seen.get(key)
      if (earlier) problems.push({ row: row.number, field: 'label', message: `Row ${row.number}: ${read.line.label} stands already in row ${earlier}.` })
      else seen.set(key, row.number)
      lines.push(read.line)
    }
    if (problems.length >= maxProblems) break
  }
  if (!rows.length) problems.push({ row: 1, message: 'The table has a heading but no line.' })
  return problems.length ? { ok: false, problems } : { ok: true, lines, warnings }
}

function readRow(row: Row, fields: LineField[], delimiter: Delimiter): { line: TableLine } | { problems: LineTableProblem[] } {
  const cells = cellsOf(row.text, delimiter)
  if (cells.length > fields.length) return { problems: [{ row: row.number, message: `Row ${row.number} has ${cells.length} columns, the heading ${fields.length}.` }] }
  const entries = fields.flatMap((field, index) => cells[index] ? [[field, textFields.includes(field) ? cells[index] : numberOf(cells[index], delimiter)] as const] : [])
  const text = entries.find(([, value]) => typeof value === 'number' && !Number.isFinite(value))
  if (text) return { problems: [{ row: row.number, field: text[0], message: `Row ${row.number}, ${text[0]}: "${cells[fields.indexOf(text[0])]}" is not a finite number.` }] }
  const parsed = tableLineSchema.safeParse(Object.fromEntries(entries))
  if (parsed.success) return { line: parsed.data }
  return { problems: parsed.error.issues.map(issue => ({ row: row.number, field: String(issue.path[0]), message: `Row ${row.number}, ${String(issue.path[0])}: ${missingOr(issue.message, cells, fields, issue.path[0])}` })) }
}

const missingOr = (message: string, cells: string[], fields: LineField[], field: PropertyKey | undefined) => cells[fields.indexOf(field as LineField)] ? message : 'is empty.'

/** A decimal comma counts where commas do not separate. */
function numberOf(cell: string, delimiter: Delimiter): number {
  const plain = delimiter !== ',' && !cell.includes('.') ? cell.replace(',', '.') : cell
  return /^[+-]?(\d+\.?\d*|\.\d+)([eEdD][+-]?\d+)?$/.test(plain) ? Number(plain.replace(/[dD]/, 'e')) : Number.NaN
}
