import { and, asc, count, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Phase } from '../../../shared/types/phases'
import type { Queryable } from '../client'
import { retrievals } from '../retrievals/schema'
import { batches } from './schema'

export type BatchRecord = typeof batches.$inferSelect

export async function insertBatch(db: Queryable, row: typeof batches.$inferInsert): Promise<void> {
  await db.insert(batches).values(row)
}

export async function findBatch(db: Queryable, id: string): Promise<BatchRecord | undefined> {
  const [row] = await db.select().from(batches).where(eq(batches.id, id))
  return row
}

export async function countPhases(db: Queryable, batchId: string): Promise<Partial<Record<Phase, number>>> {
  const rows = await db.select({ phase: retrievals.phase, count: count() }).from(retrievals).where(eq(retrievals.batchId, batchId)).groupBy(retrievals.phase)
  return Object.fromEntries(rows.map(row => [row.phase, row.count]))
}

/** Batches of several that nobody works on any more, of which something has ended, and whose digest is still due. */
export const findBatchesForDigest = (db: Queryable, since: Date, limit: number): Promise<BatchRecord[]> =>
  db.select().from(batches)
    .where(and(
      isNull(batches.digestAt), gt(batches.total, 1), gt(batches.createdAt, since),
      sql`not exists (select 1 from ${retrievals} r where r.batch_id = ${batches.id} and r.phase in ('QUEUED', 'EXECUTING'))`,
      sql`exists (select 1 from ${retrievals} r where r.batch_id = ${batches.id} and r.phase in ('COMPLETED', 'ERROR', 'ABORTED'))`,
    ))
    .orderBy(asc(batches.id)).limit(limit)

/** @returns false when another process was first */
export async function markDigested(db: Queryable, batchId: string): Promise<boolean> {
  const [{ affectedRows }] = await db.update(batches).set({ digestAt: new Date() }).where(and(eq(batches.id, batchId), isNull(batches.digestAt)))
  return affectedRows === 1
}

/** The rows of a batch as its digest names them. */
export const readBatchRows = (db: Queryable, batchId: string) =>
  db.select({
    id: retrievals.id, name: retrievals.name, phase: retrievals.phase, reason: retrievals.reason, temperature: retrievals.temperature,
    uNoise: retrievals.uNoise, strengthSet: retrievals.strengthSet, flagBits: retrievals.flagBits,
  }).from(retrievals).where(eq(retrievals.batchId, batchId)).orderBy(asc(retrievals.batchOrder))
