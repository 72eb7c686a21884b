import { asc, desc, sql, type SQL } from 'drizzle-orm'
import type { RetrievalSort } from '../../../shared/schemas/retrieval-list'
import { retrievals } from './schema'

/** Where a page starts: after this row, in this order. */
export interface Keyset {
  sort: RetrievalSort
  descending: boolean
  after: { id: string, value: string | number | Date | null } | null
}

const sortColumns = { created: retrievals.id, observed: retrievals.observedAt, temperature: retrievals.temperature, name: retrievals.name }

/** Rows without a value stand last in both directions; the id decides between equals. */
export function orderOf({ sort, descending }: Keyset): SQL[] {
  const direction = descending ? desc : asc
  if (sort === 'created') return [direction(retrievals.id)]
  return [sql`${sortColumns[sort]} is null`, direction(sortColumns[sort]), direction(retrievals.id)]
}

export function keysetAfter({ sort, descending, after }: Keyset): SQL | undefined {
  if (!after) return undefined
  const beyond = descending ? sql`<` : sql`>`
  const idBeyond = sql`${retrievals.id} ${beyond} ${after.id}`
  if (sort === 'created') return idBeyond
  const column = sortColumns[sort]
  if (after.value === null) return sql`(${column} is null and ${idBeyond})`
  return sql`(${column} is null or ${column} ${beyond} ${after.value} or (${column} = ${after.value} and ${idBeyond}))`
}
