import { and, desc, eq, gt, isNull, ne } from 'drizzle-orm'
import type { Queryable } from '../client'
import { newId } from '../ids'
import { sessions, users } from './schema'
import type { UserRow } from './repository'

export type SessionRow = typeof sessions.$inferSelect
export interface LiveSession { session: SessionRow, user: UserRow }

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

const isLive = (userId: string) => and(eq(sessions.userId, userId), isNull(sessions.revokedAt), gt(sessions.expiresAt, new Date()))

/** The sign-ins of an account that live, the last used first. */
export const listLiveSessions = (db: Queryable, userId: string): Promise<SessionRow[]> =>
  db.select().from(sessions).where(isLive(userId)).orderBy(desc(sessions.lastSeenAt), desc(sessions.id)).limit(200)

/** @returns false when the account has no such live sign-in */
export async function revokeSessionOf(db: Queryable, { userId, id }: { userId: string, id: string }): Promise<boolean> {
  const [result] = await db.update(sessions).set({ revokedAt: new Date() }).where(and(isLive(userId), eq(sessions.id, id)))
  return result.affectedRows === 1
}

/** Ends every sign-in of an account, or all but one. @returns how many */
export async function revokeSessions(db: Queryable, { userId, exceptId }: { userId: string, exceptId: string | null }): Promise<number> {
  const [result] = await db.update(sessions).set({ revokedAt: new Date() }).where(and(isLive(userId), exceptId === null ? undefined : ne(sessions.id, exceptId)))
  return result.affectedRows
}
