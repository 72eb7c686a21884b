import { DomainError } from '#shared/utils/domain-error'
import type { AccountView } from '#shared/types/account'
import type { ProfileChange } from '#shared/schemas/account'
import { database } from '../../database/client'
import { findUser, updateUser, type UserRow } from '../../database/accounts/repository'
import type { Actor } from './actor'

export async function profileOf(actor: Actor): Promise<AccountView> {
  const user = await findUser(database(), actor.userId)
  if (!user) throw new DomainError('not_found', 'This account is gone.')
  return toView(user)
}

export async function changeProfile(actor: Actor, { version, ...changes }: ProfileChange): Promise<AccountView> {
  const stored = await updateUser(database(), { id: actor.userId, version, changes })
  const current = await profileOf(actor)
  if (!stored) throw new DomainError('stale_version', 'Your account was changed elsewhere in the meantime; look at it again.', undefined, current)
  return current
}

const toView = ({ id, email, name, isAdministrator, mailPreference, createdAt, version }: UserRow): AccountView =>
  ({ id, email, name, isAdministrator, mailPreference, createdAt: createdAt.toISOString(), version })
