import * as z from 'zod'
import type { Page } from '../types/retrieval'
import { ulidSchema } from './ids'

/** Lists in the order of their ids; the cursor is the last id seen. */
export const pageQuerySchema = z.strictObject({
  limit: z.coerce.number().int().min(1).max(500).default(50),
  cursor: ulidSchema.optional(),
})
export type PageQuery = z.output<typeof pageQuerySchema>

export const pageSchema = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable(), total: z.int() })

/** From `limit + 1` rows read: a page, and the cursor when there is more. */
export function pageOf<Row, Item>(rows: Row[], { limit, total, id, view }: { limit: number, total: number, id: (row: Row) => string, view: (row: Row) => Item }): Page<Item> {
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  return { items: shown.map(view), nextCursor: rows.length > limit && last !== undefined ? id(last) : null, total }
}
