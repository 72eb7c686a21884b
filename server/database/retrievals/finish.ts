import { and, eq } from 'drizzle-orm'
import type { Queryable } from '../client'
import { databaseNow } from './clock'
import { retrievalResults, retrievals } from './schema'

export type NewResult = typeof retrievalResults.$inferInsert
type Columns = Partial<Pick<typeof retrievals.$inferInsert, 'reason' | 'fault' | 'temperature' | 'uNoise' | 'uSystematic' | 'strengthSet' | 'flagBits' | 'band' | 'verdict'>>

interface Finish {
  id: string
  revision: number
  attempt: number
  phase: 'COMPLETED' | 'ERROR' | 'ABORTED'
  columns: Columns
}

/**
 * Ends an execution, if this attempt still holds it; the attempt number is the fencing token.
 * COMPLETED and ERROR give way to an abort that was asked for meanwhile.
 * @returns false when somebody else holds or ended it: nothing may be stored then
 */
export async function finishExecution(db: Queryable, { id, revision, attempt, phase, columns }: Finish): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({ ...columns, phase, progress: 1, finishedAt: databaseNow, heartbeatAt: null, abortRequested: false })
    .where(and(
      eq(retrievals.id, id),
      eq(retrievals.revision, revision),
      eq(retrievals.attempt, attempt),
      eq(retrievals.phase, 'EXECUTING'),
      phase === 'ABORTED' ? undefined : eq(retrievals.abortRequested, false),
    ))
  return affectedRows === 1
}

export async function insertResult(db: Queryable, row: NewResult): Promise<void> {
  await db.insert(retrievalResults).values(row)
}
