import type { DeviceView } from '#shared/types/account'
import { DomainError } from '#shared/utils/domain-error'
import { listLiveSessions, revokeSessionOf, revokeSessions, type SessionRow } from '../../database/accounts/sessions-repository'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from './actor'

/** Where the account is signed in. */
export const devicesOf = async (actor: Actor): Promise<DeviceView[]> => (await listLiveSessions(database(), actor.userId)).map(row => toView(row, actor))

export const revokeDevice = (actor: Actor, id: string): Promise<void> => database().transaction(async (tx) => {
  if (!await revokeSessionOf(tx, { userId: actor.userId, id })) throw new DomainError('not_found', 'You are not signed in there any more.')
  await writeLogbook(tx, { campaignId: null, objectKind: 'account', objectId: actor.userId, actorId: actor.userId, action: 'end-sign-in' })
})

/** Ends every sign-in but the one that asks. */
export const signOutElsewhere = (actor: Actor): Promise<{ ended: number }> => database().transaction(async (tx) => {
  const ended = await revokeSessions(tx, { userId: actor.userId, exceptId: actor.sessionId })
  await writeLogbook(tx, { campaignId: null, objectKind: 'account', objectId: actor.userId, actorId: actor.userId, action: 'sign-out-elsewhere', detail: { ended } })
  return { ended }
})

const toView = ({ id, userAgent, createdAt, lastSeenAt, expiresAt }: SessionRow, actor: Actor): DeviceView => ({
  id,
  userAgent,
  createdAt: createdAt.toISOString(),
  lastSeenAt: lastSeenAt.toISOString(),
  expiresAt: expiresAt.toISOString(),
  isThisOne: id === actor.sessionId,
})
