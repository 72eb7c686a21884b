import { DomainError } from '#shared/utils/domain-error'
import type { PasswordChange } from '#shared/schemas/account'
import { findUser, setPassword } from '../../database/accounts/repository'
import { revokeSessions } from '../../database/accounts/sessions-repository'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { countUp, forgetCount } from '../../jobs/counter'
import type { Actor } from './actor'
import { hashPassword, verifyPassword } from './passwords'
import { TooManyAttempts } from './sign-in-limit'

const windowSeconds = 15 * 60
const mostTries = 10

/** Whoever sits at an open page must know the password to change it. All other sign-ins end. */
export async function changePassword(actor: Actor, { current, next }: PasswordChange): Promise<void> {
  const counter = `change-password:${actor.userId}`
  const { count, secondsLeft } = await countUp(counter, windowSeconds)
  if (count > mostTries) throw new TooManyAttempts(secondsLeft)
  const user = await findUser(database(), actor.userId)
  if (!await verifyPassword(user?.passwordHash, current)) {
    throw new DomainError('validation_failed', 'The present password is not right.', [{ path: 'current', message: 'This is not your present password.' }])
  }
  const passwordHash = await hashPassword(next)
  await database().transaction(async (tx) => {
    await setPassword(tx, { id: actor.userId, passwordHash })
    await revokeSessions(tx, { userId: actor.userId, exceptId: actor.sessionId })
    await writeLogbook(tx, { campaignId: null, objectKind: 'account', objectId: actor.userId, actorId: actor.userId, action: 'change-password' })
  })
  await forgetCount(counter)
}
