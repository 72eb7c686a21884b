import { and, asc, eq, gt, inArray, lt, max } from 'drizzle-orm'
import type { Phase } from '../../../shared/types/phases'
import type { Queryable } from '../client'
import { retrievalEvents } from './schema'

export type EventRow = typeof retrievalEvents.$inferSelect
export interface NewEvent { retrievalId: string, batchId: string, revision: number, phase: Phase, progress: number, kind?: 'phase' | 'progress' }

/** Written in the transaction of the change that it tells. */
export async function insertEvents(db: Queryable, events: NewEvent[]): Promise<void> {
  if (events.length === 0) return
  const at = new Date()
  await db.insert(retrievalEvents).values(events.map(event => ({ kind: 'phase' as const, ...event, at })))
}

export type EventScope = { batchId: string } | { retrievalId: string }

/** One page of what happened after an id, for a stream that opens. */
export const readEventsAfter = (db: Queryable, scope: EventScope, afterId: number, limit: number): Promise<EventRow[]> =>
  db.select().from(retrievalEvents)
    .where(and(
      'batchId' in scope ? eq(retrievalEvents.batchId, scope.batchId) : eq(retrievalEvents.retrievalId, scope.retrievalId),
      gt(retrievalEvents.id, afterId),
    ))
    .orderBy(asc(retrievalEvents.id)).limit(limit)

/** What happened anywhere after an id, for the poller that serves all open streams. */
export const readAllEventsAfter = (db: Queryable, afterId: number, limit: number): Promise<EventRow[]> =>
  db.select().from(retrievalEvents).where(gt(retrievalEvents.id, afterId)).orderBy(asc(retrievalEvents.id)).limit(limit)

export async function newestEventId(db: Queryable): Promise<number> {
  const [row] = await db.select({ id: max(retrievalEvents.id) }).from(retrievalEvents)
  return row?.id ?? 0
}

/** Deletes at most `limit` old events. @returns how many */
export async function deleteEventsBefore(db: Queryable, before: Date, limit: number): Promise<number> {
  const old = await db.select({ id: retrievalEvents.id }).from(retrievalEvents).where(lt(retrievalEvents.at, before)).orderBy(asc(retrievalEvents.id)).limit(limit)
  if (old.length > 0) await db.delete(retrievalEvents).where(inArray(retrievalEvents.id, old.map(row => row.id)))
  return old.length
}
