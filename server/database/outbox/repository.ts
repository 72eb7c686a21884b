import { and, asc, eq, lte } from 'drizzle-orm'
import type { Queryable } from '../client'
import { outbox } from './schema'

export type OutboxRecord = typeof outbox.$inferSelect

type NewMail = Pick<OutboxRecord, 'id' | 'subjectKey' | 'kind' | 'payload' | 'messageId'> & ({ userId: string } | { address: string })

export async function insertOutbox(db: Queryable, row: NewMail): Promise<void> {
  const now = new Date()
  await db.insert(outbox).values({ ...row, nextAttemptAt: now, createdAt: now })
}

/** The oldest mail that is due, locked until the transaction ends; mails that others hold are passed over. */
export async function lockDueMail(db: Queryable, now: Date): Promise<OutboxRecord | undefined> {
  const [row] = await db.select().from(outbox)
    .where(and(eq(outbox.state, 'waiting'), lte(outbox.nextAttemptAt, now)))
    .orderBy(asc(outbox.nextAttemptAt)).limit(1).for('update', { skipLocked: true })
  return row
}

export async function updateMail(db: Queryable, id: string, change: Partial<Pick<OutboxRecord, 'state' | 'attempts' | 'lastError' | 'nextAttemptAt' | 'sentAt'>>): Promise<void> {
  await db.update(outbox).set(change).where(eq(outbox.id, id))
}
