import { and, eq, inArray, sql } from 'drizzle-orm'
import type { RetrievalSettings } from '../../../shared/schemas/settings'
import type { Phase } from '../../../shared/types/phases'
import type { Queryable } from '../client'
import { databaseNow } from './clock'
import { retrievals, reviews } from './schema'

interface Target { id: string, revision: number }
const inPhase = ({ id, revision }: Target, phases: Phase[]) =>
  and(eq(retrievals.id, id), eq(retrievals.revision, revision), inArray(retrievals.phase, phases))

/** Ends a retrieval that nobody executes. */
export async function abortIdle(db: Queryable, target: Target, reason: string): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({ phase: 'ABORTED', reason, finishedAt: databaseNow, abortRequested: false })
    .where(inPhase(target, ['PENDING', 'QUEUED', 'HELD']))
  return affectedRows === 1
}

/** Leaves word for whoever executes it. */
export async function requestAbort(db: Queryable, target: Target, reason: string): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals).set({ abortRequested: true, reason, version: sql`${retrievals.version} + 1` }).where(inPhase(target, ['EXECUTING']))
  return affectedRows === 1
}

/** `latest`: what is known of its spectrum by now. */
export async function queueDraft(db: Queryable, target: Target, latest: Partial<Pick<typeof retrievals.$inferInsert, 'name' | 'observedAt' | 'stationId' | 'instrumentId'>>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({ ...latest, phase: 'QUEUED', reason: null, queuedAt: databaseNow, dispatchedAt: databaseNow })
    .where(inPhase(target, ['PENDING', 'HELD']))
  return affectedRows === 1
}

interface NewRevision { settings: RetrievalSettings, settingsHash: string, note: string }

/** Queues the next revision. The columns of the old result stay until the new one is there. */
export async function startRevision(db: Queryable, target: Target, change: NewRevision): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({
      ...change, revision: sql`${retrievals.revision} + 1`, phase: 'QUEUED', progress: 0, reason: null, fault: false, abortRequested: false,
      attemptsBefore: sql`${retrievals.attempt}`,
      dispatch: sql`${retrievals.dispatch} + 1`, dispatchedAt: databaseNow, queuedAt: databaseNow, startedAt: null, finishedAt: null,
    })
    .where(inPhase(target, ['COMPLETED', 'ERROR', 'ABORTED']))
  return affectedRows === 1
}

export async function setVerdict(db: Queryable, target: Target, verdict: 'accept' | 'return'): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals).set({ verdict, version: sql`${retrievals.version} + 1` }).where(inPhase(target, ['COMPLETED']))
  return affectedRows === 1
}

export async function insertReview(db: Queryable, row: typeof reviews.$inferInsert): Promise<void> {
  await db.insert(reviews).values(row)
}
