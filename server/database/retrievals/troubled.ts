import { and, asc, count, desc, eq, lt, min, or, sql, type SQL } from 'drizzle-orm'
import type { Phase } from '../../../shared/types/phases'
import { campaigns } from '../campaigns/schema'
import type { Queryable } from '../client'
import { databaseNow, secondsAgo } from './clock'
import { retrievals } from './schema'

/** After so long without a sign of life the reconciling task should have acted. */
const silentSeconds = 60

const isFault = and(eq(retrievals.phase, 'ERROR'), eq(retrievals.fault, true))
const isSilent = and(eq(retrievals.phase, 'EXECUTING'), or(sql`${retrievals.heartbeatAt} is null`, lt(retrievals.heartbeatAt, secondsAgo(silentSeconds))))
const isOverlong = (seconds: number) => and(eq(retrievals.phase, 'EXECUTING'), lt(retrievals.startedAt, secondsAgo(seconds)))

const isTroubled = (overlongSeconds: number): SQL | undefined => or(isFault, isSilent, isOverlong(overlongSeconds))

/** Failed through a fault of the service, or executing without a sign of life or for too long. Nothing of their content. */
export const findTroubled = (db: Queryable, { overlongSeconds, limit }: { overlongSeconds: number, limit: number }) =>
  db.select({
    id: retrievals.id, campaign: campaigns.title, phase: retrievals.phase, reason: retrievals.reason, attempt: retrievals.attempt, attemptsBefore: retrievals.attemptsBefore,
    startedAt: retrievals.startedAt, finishedAt: retrievals.finishedAt, heartbeatAt: retrievals.heartbeatAt, isSilent: sql<number>`${isSilent}`,
  }).from(retrievals).innerJoin(campaigns, eq(campaigns.id, retrievals.campaignId))
    .where(isTroubled(overlongSeconds)).orderBy(desc(retrievals.id)).limit(limit)

export const countTroubled = (db: Queryable, overlongSeconds: number): Promise<number> => db.$count(retrievals, isTroubled(overlongSeconds))

export type TroubledRow = Awaited<ReturnType<typeof findTroubled>>[number]

/** Takes an execution away from whoever holds it: the next attempt number shuts them out. */
export async function takeBack(db: Queryable, { id, attempt, overlongSeconds }: { id: string, attempt: number, overlongSeconds: number }): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({
      phase: 'QUEUED', attempt: attempt + 1, attemptsBefore: attempt + 1, dispatch: sql`${retrievals.dispatch} + 1`,
      dispatchedAt: databaseNow, heartbeatAt: null, progress: 0,
    })
    .where(and(eq(retrievals.id, id), eq(retrievals.attempt, attempt), or(isSilent, isOverlong(overlongSeconds))))
  return affectedRows === 1
}

export async function countByPhase(db: Queryable): Promise<Partial<Record<Phase, number>>> {
  const rows = await db.select({ phase: retrievals.phase, count: count() }).from(retrievals).groupBy(retrievals.phase).orderBy(asc(retrievals.phase))
  return Object.fromEntries(rows.map(row => [row.phase, row.count]))
}

/** Since when the oldest waiting retrieval waits. */
export async function oldestQueuedAt(db: Queryable): Promise<Date | null> {
  const [row] = await db.select({ at: min(retrievals.queuedAt) }).from(retrievals).where(eq(retrievals.phase, 'QUEUED'))
  return row?.at ?? null
}
