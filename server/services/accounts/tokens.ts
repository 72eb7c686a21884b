import { DomainError } from '#shared/utils/domain-error'
import type { ApiTokenView } from '#shared/types/account'
import type { TokenScope } from '#shared/types/roles'
import { database } from '../../database/client'
import { findTokenByHash, insertToken, listTokens, revokeToken, touchToken, type ApiTokenRow } from '../../database/accounts/tokens-repository'
import { logger } from '../../logger'
import type { Actor } from './actor'
import { apiTokenPrefix, hashSecret, newApiToken } from './secret-token.mjs'

const touchAfterMs = 60_000

/** Who a bearer token speaks for. */
export async function actorFromToken(token: string): Promise<Actor> {
  const found = token.startsWith(apiTokenPrefix) ? await findTokenByHash(database(), hashSecret(token)) : undefined
  if (!found) throw new DomainError('unauthenticated', 'This API token is unknown or was revoked.')
  if (found.token.expiresAt && found.token.expiresAt <= new Date()) throw new DomainError('token_expired', 'This API token has expired; make a new one on your account page.')
  noteUse(found.token)
  const { id: userId, email, name, isAdministrator, mailPreference } = found.user
  return { userId, email, name, isAdministrator, mailPreference, via: 'token', sessionId: null, scope: found.token.scope }
}

function noteUse({ id, lastUsedAt }: ApiTokenRow): void {
  if (lastUsedAt && Date.now() - lastUsedAt.getTime() < touchAfterMs) return
  touchToken(database(), id).catch((error: Error) => logger.warn({ reason: error.message }, 'token use not stored'))
}

/** Makes a token; its text is in this answer and nowhere else. */
export async function createToken(actor: Actor, { name, scope, expiresInDays }: { name: string, scope: TokenScope, expiresInDays: number | null }): Promise<ApiTokenView & { token: string }> {
  const token = newApiToken()
  const expiresAt = expiresInDays === null ? null : new Date(Date.now() + expiresInDays * 86_400_000)
  const row = await insertToken(database(), { userId: actor.userId, name, scope, expiresAt, tokenHash: hashSecret(token) })
  return { ...toView(row), token }
}

export const tokensOf = async (actor: Actor): Promise<ApiTokenView[]> => (await listTokens(database(), actor.userId)).map(toView)

export async function deleteToken(actor: Actor, id: string): Promise<void> {
  if (!await revokeToken(database(), { userId: actor.userId, id })) throw new DomainError('not_found', 'You have no such token.')
}

const toView = (row: ApiTokenRow): ApiTokenView => ({
  id: row.id,
  name: row.name,
  scope: row.scope,
  createdAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt?.toISOString() ?? null,
  lastUsedAt: row.lastUsedAt?.toISOString() ?? null,
})
