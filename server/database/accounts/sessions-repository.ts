import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Queryable } from '../client'
import { newId } from '../ids'
import { sessions, users } from './schema'
import type { UserRow } from './repository'

export interface LiveSession { session: typeof sessions.$inferSelect, user: UserRow }

export async function insertSession(db: Queryable, { userId, userAgent, expiresAt }: { userId: string, userAgent: string, expiresAt: Date }): Promise<string> {
  const id = newId()
  const now = new Date()
  await db.insert(sessions).values({ id, userId, userAgent: userAgent.slice(0, 300), createdAt: now, lastSeenAt: now, expiresAt })
  return id
}

/** The session with its account, unless it was revoked, has expired, or the account was deactivated. */
export async function findLiveSession(db: Queryable, id: string): Promise<LiveSession | undefined> {
  const [row] = await db.select({ session: sessions, user: users }).from(sessions)
    .innerJoin(users, eq(users.id, sessions.userId))
    .where(and(eq(sessions.id, id), isNull(sessions.revokedAt), gt(sessions.expiresAt, new Date()), isNull(users.deactivatedAt)))
    .limit(1)
  return row
}

export async function touchSession(db: Queryable, id: string): Promise<void> {
  await db.update(sessions).set({ lastSeenAt: new Date() }).where(eq(sessions.id, id))
}

export async function revokeSession(db: Queryable, id: string): Promise<void> {
  await db.update(sessions).set({ revokedAt: new Date() }).where(and(eq(sessions.id, id), isNull(sessions.revokedAt)))
}
