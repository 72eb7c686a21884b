import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { takeLink } from '../../database/accounts/links-repository'
import { administratorExists, findUserByEmail, insertUser } from '../../database/accounts/repository'
import { hashPassword } from './passwords'
import { hashSecret } from './secret-token.mjs'

/** Makes the first administrator from the one-time link that the start script printed. */
export const setUpFirstAdministrator = (input: { token: string, email: string, name: string, password: string }): Promise<{ id: string, email: string }> =>
  database().transaction(async (db) => {
    if (!await takeLink(db, { purpose: 'set-up', tokenHash: hashSecret(input.token) })) {
      throw new DomainError('not_found', 'This set-up link is unknown, used or too old; start the service again to get a new one.')
    }
    if (await administratorExists(db)) throw new DomainError('conflict', 'There is an administrator already; sign in.')
    if (await findUserByEmail(db, input.email)) throw new DomainError('conflict', 'There is an account with this e-mail address already.')
    const passwordHash = await hashPassword(input.password)
    return { id: await insertUser(db, { email: input.email, name: input.name, passwordHash, isAdministrator: true }), email: input.email }
  })
