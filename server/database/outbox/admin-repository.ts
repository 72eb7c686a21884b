import { and, count, desc, eq, inArray, lt } from 'drizzle-orm'
import { users } from '../accounts/schema'
import type { Queryable } from '../client'
import { outbox } from './schema'
import type { OutboxRecord } from './repository'

export interface ListedMail { mail: OutboxRecord, accountEmail: string | null }

const mails = (db: Queryable) => db.select({ mail: outbox, accountEmail: users.email }).from(outbox).leftJoin(users, eq(users.id, outbox.userId))

/** The newest first. */
export const findMails = (db: Queryable, states: OutboxRecord['state'][], { before, limit }: { before: string | null, limit: number }): Promise<ListedMail[]> =>
  mails(db).where(and(inArray(outbox.state, states), before ? lt(outbox.id, before) : undefined)).orderBy(desc(outbox.id)).limit(limit)

export const countMails = (db: Queryable, states: OutboxRecord['state'][]) => db.$count(outbox, inArray(outbox.state, states))

export async function findMail(db: Queryable, id: string): Promise<ListedMail | undefined> {
  const [row] = await mails(db).where(eq(outbox.id, id))
  return row
}

export async function countMailsByState(db: Queryable): Promise<Record<OutboxRecord['state'], number>> {
  const rows = await db.select({ state: outbox.state, count: count() }).from(outbox).groupBy(outbox.state)
  return { waiting: 0, sent: 0, failed: 0, ...Object.fromEntries(rows.map(row => [row.state, row.count])) }
}

/** Due at once, with all its tries before it. @returns false when it was sent meanwhile */
export async function dueAgain(db: Queryable, id: string): Promise<boolean> {
  const [{ affectedRows }] = await db.update(outbox).set({ state: 'waiting', attempts: 0, nextAttemptAt: new Date() })
    .where(and(eq(outbox.id, id), inArray(outbox.state, ['waiting', 'failed'])))
  return affectedRows === 1
}
