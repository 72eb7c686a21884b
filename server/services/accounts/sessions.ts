import { database } from '../../database/client'
import { findUserByEmail, type UserRow } from '../../database/accounts/repository'
import { findLiveSession, insertSession, revokeSession, touchSession } from '../../database/accounts/sessions-repository'
import { logger } from '../../logger'
import type { Actor } from './actor'
import { verifyPassword } from './passwords'

/** A sign-in lasts this long, whatever happens in between. */
export const sessionSeconds = 30 * 24 * 3600
const touchAfterMs = 60_000

export interface SignedIn { sessionId: string, actor: Actor, expiresAt: Date }

/** Checks e-mail and password and opens a session. Unknown address and wrong password are the same: null. */
export async function openSession({ email, password, userAgent }: { email: string, password: string, userAgent: string }): Promise<{ userId: string, sessionId: string } | null> {
  const user = await findUserByEmail(database(), email.trim().toLowerCase())
  const usable = user && !user.deactivatedAt ? user : undefined
  if (!await verifyPassword(usable?.passwordHash, password) || !usable) return null
  const expiresAt = new Date(Date.now() + sessionSeconds * 1000)
  return { userId: usable.id, sessionId: await insertSession(database(), { userId: usable.id, userAgent, expiresAt }) }
}

/** Who the session belongs to, if it still lives. */
export async function resumeSession(sessionId: string): Promise<SignedIn | null> {
  const live = await findLiveSession(database(), sessionId)
  if (!live) return null
  if (Date.now() - live.session.lastSeenAt.getTime() > touchAfterMs) {
    touchSession(database(), sessionId).catch((error: Error) => logger.warn({ reason: error.message }, 'last-seen time not stored'))
  }
  return { sessionId, actor: toActor(live.user, sessionId), expiresAt: live.session.expiresAt }
}

export const closeSession = (sessionId: string): Promise<void> => revokeSession(database(), sessionId)

const toActor = (user: UserRow, sessionId: string): Actor => ({
  userId: user.id,
  email: user.email,
  name: user.name,
  isAdministrator: user.isAdministrator,
  mailPreference: user.mailPreference,
  via: 'session',
  sessionId,
  scope: 'submit',
})
