import { and, eq, inArray, isNull, lt, or, sql } from 'drizzle-orm'
import type { MailPreference } from '../../../shared/types/roles'
import { users } from '../accounts/schema'
import { batches } from '../batches/schema'
import type { Queryable } from '../client'
import { spectra } from '../spectra/schema'
import { databaseNow, secondsAgo } from './clock'
import { retrievals } from './schema'

export type RetrievalRecord = typeof retrievals.$inferSelect
/** A retrieval whose execution this process holds, with what its end needs to know. */
export interface ClaimedRetrieval {
  retrieval: RetrievalRecord
  inputSha256: string | null
  mailPreference: MailPreference
  batchTotal: number
  batchDigestAt: Date | null
}

/** An execution that has not been heard of for so long is taken to be dead. */
export const staleHeartbeatSeconds = 8

const isStale = or(isNull(retrievals.heartbeatAt), lt(retrievals.heartbeatAt, secondsAgo(staleHeartbeatSeconds)))

/** Takes a waiting (or dead) retrieval: its attempt number rises, which shuts out whoever held it before. */
export async function takeRetrieval(db: Queryable, { id, revision }: { id: string, revision: number }): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals)
    .set({ phase: 'EXECUTING', attempt: sql`${retrievals.attempt} + 1`, heartbeatAt: databaseNow, startedAt: databaseNow, progress: 0 })
    .where(and(
      eq(retrievals.id, id),
      eq(retrievals.revision, revision),
      or(eq(retrievals.phase, 'QUEUED'), and(eq(retrievals.phase, 'EXECUTING'), isStale)),
    ))
  return affectedRows === 1
}

export async function readClaimed(db: Queryable, id: string): Promise<ClaimedRetrieval | undefined> {
  const [row] = await db.select({
    retrieval: retrievals,
    inputSha256: spectra.sha256,
    mailPreference: users.mailPreference,
    batchTotal: batches.total,
    batchDigestAt: batches.digestAt,
  }).from(retrievals)
    .innerJoin(users, eq(users.id, retrievals.ownerId))
    .innerJoin(batches, eq(batches.id, retrievals.batchId))
    .leftJoin(spectra, eq(spectra.id, retrievals.spectrumId))
    .where(eq(retrievals.id, id))
  return row
}

interface Held { id: string, attempt: number }
const isHeld = ({ id, attempt }: Held) => and(eq(retrievals.id, id), eq(retrievals.attempt, attempt), eq(retrievals.phase, 'EXECUTING'))

/** Says that these executions are alive. */
export async function beat(db: Queryable, held: Held[]): Promise<void> {
  if (held.length > 0) await db.update(retrievals).set({ heartbeatAt: databaseNow }).where(or(...held.map(isHeld)))
}

/** What the holder must know between two chunks: is it still the holder, and does somebody want an end? */
export async function readAbortFlag(db: Queryable, held: Held): Promise<{ abortRequested: boolean } | undefined> {
  const [row] = await db.select({ abortRequested: retrievals.abortRequested }).from(retrievals).where(isHeld(held))
  return row
}

/** Gives an unfinished execution back to the queue. */
export async function releaseRetrieval(db: Queryable, held: Held): Promise<boolean> {
  const [{ affectedRows }] = await db.update(retrievals).set({ phase: 'QUEUED', heartbeatAt: null, progress: 0 }).where(isHeld(held))
  return affectedRows === 1
}

/** Rows that wait or run, for the tasks that look after them. */
export const waitingOrRunning = inArray(retrievals.phase, ['QUEUED', 'EXECUTING'])
