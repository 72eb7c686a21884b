import type { Queryable } from '../client'
import { retrievals } from './schema'

export type NewRetrieval = typeof retrievals.$inferInsert

/** 1000 rows make five statements, each far below the packet limit. */
const rowsPerStatement = 200

export async function insertRetrievals(db: Queryable, rows: NewRetrieval[]): Promise<void> {
  for (let start = 0; start < rows.length; start += rowsPerStatement) {
    await db.insert(retrievals).values(rows.slice(start, start + rowsPerStatement))
  }
}
