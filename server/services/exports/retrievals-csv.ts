import { stringify } from 'csv-stringify/sync'
import { bitsToFlags } from '#shared/engine/flags'
import { printTemperature } from '#shared/engine/format-value'
import type { RetrievalExportQuery } from '#shared/schemas/retrieval-list'
import { database } from '../../database/client'
import { readRetrievalPage, type ListedRetrieval } from '../../database/retrievals/list'
import type { Actor } from '../accounts/actor'
import { cursorAfter, keysetOf } from '../retrievals/cursor'
import { visibleCondition } from '../retrievals/list'

type Cell = string | number | null
const rowsAtOnce = 500

/** Numbers in full for programs; beside them the digits that the page and the mail print. */
const columns: [name: string, value: (row: ListedRetrieval) => Cell][] = [
  ['id', row => row.id],
  ['name', row => row.name],
  ['campaign', row => row.campaignSlug],
  ['station', row => row.station],
  ['instrument', row => row.instrument],
  ['observed_at', row => row.observedAt?.toISOString() ?? null],
  ['phase', row => row.phase],
  ['band', row => row.band],
  ['recipe', row => row.recipeSlug ? `${row.recipeSlug}@${row.recipeVersion}` : null],
  ['strength_set', row => row.strengthSet],
  ['temperature_K', row => row.temperature],
  ['u_noise_K', row => row.uNoise],
  ['u_systematic_K', row => row.uSystematic],
  ['temperature_printed', row => printed(row)?.value ?? null],
  ['u_noise_printed', row => printed(row)?.uncertainty ?? null],
  ['flags', row => bitsToFlags(row.flagBits).join(' ')],
  ['verdict', row => row.verdict],
  ['revision', row => row.revision],
  ['reason', row => row.reason],
  ['owner', row => row.owner],
  ['batch', row => row.batchId],
  ['created_at', row => row.createdAt.toISOString()],
  ['finished_at', row => row.finishedAt?.toISOString() ?? null],
]

const printed = ({ temperature, uNoise }: ListedRetrieval) => temperature === null ? null : printTemperature({ value: temperature, uNoise })

/** Rows as lines of CSV (RFC 4180). Text that a spreadsheet would take for a formula is disarmed. */
export const csvLines = (rows: ListedRetrieval[]): string =>
  stringify(rows.map(row => columns.map(([, value]) => value(row))), { escape_formulas: true, record_delimiter: '\r\n' })

export const csvHeader = (): string => stringify([columns.map(([name]) => name)], { record_delimiter: '\r\n' })

/** The caller's filter as CSV, page by page, so that its size does not matter. */
export async function* retrievalsCsv(actor: Actor, query: RetrievalExportQuery): AsyncGenerator<string> {
  const where = await visibleCondition(actor, query)
  yield csvHeader()
  for (let cursor: string | undefined; ;) {
    const rows = await readRetrievalPage(database(), { where, keyset: keysetOf(query.sort, cursor), limit: rowsAtOnce })
    const last = rows.at(-1)
    if (last) yield csvLines(rows)
    if (!last || rows.length < rowsAtOnce) return
    cursor = cursorAfter(query.sort, last)
  }
}
