import * as z from 'zod'
import { retrievalSorts, type RetrievalListQuery, type RetrievalSort } from '#shared/schemas/retrieval-list'
import { DomainError } from '#shared/utils/domain-error'
import type { Keyset } from '../../database/retrievals/keyset'
import type { ListedRetrieval } from '../../database/retrievals/list'

const cursorSchema = z.strictObject({ s: z.string(), id: z.string().length(26), v: z.union([z.string().max(200), z.number(), z.null()]) })

const valueOf: Record<RetrievalSort, (row: ListedRetrieval) => string | number | Date | null> = {
  created: () => null,
  observed: row => row.observedAt,
  temperature: row => row.temperature,
  name: row => row.name,
}

const sortOf = (key: RetrievalListQuery['sort']) => ({
  sort: retrievalSorts.find(sort => sort === key.replace('-', '')) ?? 'created',
  descending: key.startsWith('-'),
})

/** The text that says where the next page starts. */
export function cursorAfter(key: RetrievalListQuery['sort'], row: ListedRetrieval): string {
  const value = valueOf[sortOf(key).sort](row)
  return Buffer.from(JSON.stringify({ s: key, id: row.id, v: value instanceof Date ? value.toISOString() : value })).toString('base64url')
}

export function keysetOf(key: RetrievalListQuery['sort'], cursor: string | undefined): Keyset {
  const { sort, descending } = sortOf(key)
  if (!cursor) return { sort, descending, after: null }
  const { s, id, v } = readCursor(cursor)
  if (s !== key) throw badCursor()
  return { sort, descending, after: { id, value: sort === 'observed' && typeof v === 'string' ? new Date(v) : v } }
}

function readCursor(cursor: string): z.output<typeof cursorSchema> {
  try {
    return cursorSchema.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')))
  }
  catch {
    throw badCursor()
  }
}

const badCursor = () => new DomainError('validation_failed', 'This cursor belongs to another list. Start without one.', [{ path: 'cursor', message: 'Not a cursor of this list and order.' }])
