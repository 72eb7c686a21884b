import { and, desc, eq, isNull } from 'drizzle-orm'
import type { TokenScope } from '#shared/types/roles'
import type { Queryable } from '../client'
import { newId } from '../ids'
import { apiTokens, users } from './schema'
import type { UserRow } from './repository'

export type ApiTokenRow = typeof apiTokens.$inferSelect

export async function insertToken(db: Queryable, token: { userId: string, name: string, tokenHash: string, scope: TokenScope, expiresAt: Date | null }): Promise<ApiTokenRow> {
  const row = { id: newId(), ...token, createdAt: new Date(), lastUsedAt: null, revokedAt: null }
  await db.insert(apiTokens).values(row)
  return row
}

/** The token with its account, expired or not; a revoked one, or one of a deactivated account, is not found. */
export async function findTokenByHash(db: Queryable, tokenHash: string): Promise<{ token: ApiTokenRow, user: UserRow } | undefined> {
  const [row] = await db.select({ token: apiTokens, user: users }).from(apiTokens)
    .innerJoin(users, eq(users.id, apiTokens.userId))
    .where(and(eq(apiTokens.tokenHash, tokenHash), isNull(apiTokens.revokedAt), isNull(users.deactivatedAt)))
    .limit(1)
  return row
}

export const listTokens = (db: Queryable, userId: string): Promise<ApiTokenRow[]> =>
  db.select().from(apiTokens).where(and(eq(apiTokens.userId, userId), isNull(apiTokens.revokedAt))).orderBy(desc(apiTokens.id))

export async function touchToken(db: Queryable, id: string): Promise<void> {
  await db.update(apiTokens).set({ lastUsedAt: new Date() }).where(eq(apiTokens.id, id))
}

/** @returns false when the account has no such live token */
export async function revokeToken(db: Queryable, { userId, id }: { userId: string, id: string }): Promise<boolean> {
  const [result] = await db.update(apiTokens).set({ revokedAt: new Date() })
    .where(and(eq(apiTokens.id, id), eq(apiTokens.userId, userId), isNull(apiTokens.revokedAt)))
  return result.affectedRows === 1
}
