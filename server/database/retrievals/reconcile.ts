import { and, asc, eq, inArray, isNull, lt, or, sql } from 'drizzle-orm'
import type { Queryable } from '../client'
import { staleHeartbeatSeconds, waitingOrRunning } from './claim'
import { databaseNow, secondsAgo } from './clock'
import { retrievals } from './schema'

export interface Dispatch { id: string, revision: number, dispatch: number }

/** A job that was handed to the queue so recently may still be on its way. */
const graceSeconds = 4

/** Rows whose job may be lost: waiting for longer than it takes to queue them, or running without a sign of life. */
export const findDoubtful = (db: Queryable, { afterId, limit }: { afterId: string, limit: number }): Promise<Dispatch[]> =>
  db.select({ id: retrievals.id, revision: retrievals.revision, dispatch: retrievals.dispatch }).from(retrievals)
    .where(and(
      sql`${retrievals.id} > ${afterId}`,
      or(
        and(eq(retrievals.phase, 'QUEUED'), or(isNull(retrievals.dispatchedAt), lt(retrievals.dispatchedAt, secondsAgo(graceSeconds)))),
        and(eq(retrievals.phase, 'EXECUTING'), or(isNull(retrievals.heartbeatAt), lt(retrievals.heartbeatAt, secondsAgo(staleHeartbeatSeconds)))),
      ),
    ))
    .orderBy(asc(retrievals.id)).limit(limit)

/** A lost job gets a new number: the queue does nothing with a job id that it has met. */
export async function raiseDispatch(db: Queryable, ids: string[]): Promise<void> {
  await db.update(retrievals)
    .set({ dispatch: sql`${retrievals.dispatch} + 1`, dispatchedAt: databaseNow })
    .where(and(inArray(retrievals.id, ids), waitingOrRunning))
}

export const readDispatches = (db: Queryable, ids: string[]): Promise<Dispatch[]> =>
  db.select({ id: retrievals.id, revision: retrievals.revision, dispatch: retrievals.dispatch }).from(retrievals)
    .where(and(inArray(retrievals.id, ids), waitingOrRunning))
