import { and, asc, desc, eq, gt, inArray, lt, lte, sql } from 'drizzle-orm'
import type { Phase } from '../../../shared/types/phases'
import type { Queryable } from '../client'
import { databaseNow, secondsAgo } from './clock'
import { retrievalEvents } from './schema'

export type EventRow = typeof retrievalEvents.$inferSelect
export interface NewEvent { retrievalId: string, batchId: string, revision: number, phase: Phase, progress: number, kind?: 'phase' | 'progress' }

/** Written in the transaction of the change that it tells. */
export async function insertEvents(db: Queryable, events: NewEvent[]): Promise<void> {
  if (events.length === 0) return
  await db.insert(retrievalEvents).values(events.map(event => ({ kind: 'phase' as const, ...event, at: databaseNow })))
}

export type EventScope = { batchId: string } | { retrievalId: string }

/** One page of what happened after an id and up to another, for a stream that opens. */
export const readEventsBetween = (db: Queryable, scope: EventScope, afterId: number, upToId: number, limit: number): Promise<EventRow[]> =>
  db.select().from(retrievalEvents)
    .where(and(
      'batchId' in scope ? eq(retrievalEvents.batchId, scope.batchId) : eq(retrievalEvents.retrievalId, scope.retrievalId),
      gt(retrievalEvents.id, afterId),
      lte(retrievalEvents.id, upToId),
    ))
    .orderBy(asc(retrievalEvents.id)).limit(limit)

const ageMs = sql<number>`timestampdiff(microsecond, ${retrievalEvents.at}, utc_timestamp(3)) div 1000`.mapWith(Number)

/** What happened anywhere after an id, for the poller that serves all open streams, and how long ago by the database's clock. */
export async function readAllEventsAfter(db: Queryable, afterId: number, limit: number): Promise<(EventRow & { ageMs: number })[]> {
  const rows = await db.select({ event: retrievalEvents, ageMs }).from(retrievalEvents).where(gt(retrievalEvents.id, afterId)).orderBy(asc(retrievalEvents.id)).limit(limit)
  return rows.map(row => ({ ...row.event, ageMs: row.ageMs }))
}

/** The newest event that is older than this; 0 when there is none. */
export async function newestIdOlderThan(db: Queryable, milliseconds: number): Promise<number> {
  const [row] = await db.select({ id: retrievalEvents.id }).from(retrievalEvents)
    .where(lt(retrievalEvents.at, secondsAgo(milliseconds / 1000))).orderBy(desc(retrievalEvents.id)).limit(1)
  return row?.id ?? 0
}

/** Deletes at most `limit` old events. @returns how many */
export async function deleteEventsBefore(db: Queryable, before: Date, limit: number): Promise<number> {
  const old = await db.select({ id: retrievalEvents.id }).from(retrievalEvents).where(lt(retrievalEvents.at, before)).orderBy(asc(retrievalEvents.id)).limit(limit)
  if (old.length > 0) await db.delete(retrievalEvents).where(inArray(retrievalEvents.id, old.map(row => row.id)))
  return old.length
}
