import { and, desc, eq, isNotNull, isNull, like, lt, max, or, sql, type SQL } from 'drizzle-orm'
import type { AccountFilter } from '#shared/schemas/admin'
import { memberships } from '../campaigns/schema'
import type { Queryable, Transaction } from '../client'
import { containing } from '../containing'
import { apiTokens, sessions, users } from './schema'
import type { UserRow } from './repository'

export interface SeenAccount { user: UserRow, seenAt: Date | null, tokenUsedAt: Date | null, campaignCount: number | null }

function conditionOf({ q, state }: AccountFilter): SQL | undefined {
  return and(
    q ? or(like(users.name, containing(q)), like(users.email, containing(q))) : undefined,
    state === 'active' ? isNull(users.deactivatedAt) : state === 'deactivated' ? isNotNull(users.deactivatedAt) : undefined,
    state === 'administrator' ? eq(users.isAdministrator, true) : undefined,
  )
}

function seenAccounts(db: Queryable) {
  const visits = db.select({ userId: sessions.userId, at: max(sessions.lastSeenAt).as('seen_at') }).from(sessions).groupBy(sessions.userId).as('visits')
  const uses = db.select({ userId: apiTokens.userId, at: max(apiTokens.lastUsedAt).as('used_at') }).from(apiTokens).groupBy(apiTokens.userId).as('uses')
  const places = db.select({ userId: memberships.userId, count: sql<number>`count(*)`.as('place_count') }).from(memberships).groupBy(memberships.userId).as('places')
  return db.select({ user: users, seenAt: visits.at, tokenUsedAt: uses.at, campaignCount: places.count }).from(users)
    .leftJoin(visits, eq(visits.userId, users.id)).leftJoin(uses, eq(uses.userId, users.id)).leftJoin(places, eq(places.userId, users.id))
}

/** The newest first. */
export const findAccounts = (db: Queryable, filter: AccountFilter, { before, limit }: { before: string | null, limit: number }): Promise<SeenAccount[]> =>
  seenAccounts(db).where(and(conditionOf(filter), before ? lt(users.id, before) : undefined)).orderBy(desc(users.id)).limit(limit)

export const countAccounts = (db: Queryable, filter: AccountFilter): Promise<number> => db.$count(users, conditionOf(filter))

export async function findAccount(db: Queryable, id: string): Promise<SeenAccount | undefined> {
  const [row] = await seenAccounts(db).where(eq(users.id, id))
  return row
}

/** Administrators who can act, held still until the transaction ends, so that two cannot go at once. */
export const lockAdministrators = (tx: Transaction): Promise<{ id: string }[]> =>
  tx.select({ id: users.id }).from(users).where(and(eq(users.isAdministrator, true), isNull(users.deactivatedAt))).for('update')

/** @returns false when the account has moved on from `version` */
export async function updateStanding(db: Queryable, { id, version }: { id: string, version: number }, change: Partial<Pick<UserRow, 'isAdministrator' | 'deactivatedAt'>>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(users).set({ ...change, version: sql`${users.version} + 1` }).where(and(eq(users.id, id), eq(users.version, version)))
  return affectedRows === 1
}

export async function revokeAllSessions(db: Queryable, userId: string): Promise<void> {
  await db.update(sessions).set({ revokedAt: new Date() }).where(and(eq(sessions.userId, userId), isNull(sessions.revokedAt)))
}
