import type { InvitationRow } from '../../database/invitations/repository'
import { linkSecret } from '../accounts/link-secret'
import { hashSecret } from '../accounts/secret-token.mjs'

const validDays = 7

type Sending = Pick<InvitationRow, 'id' | 'round'>

const secretOf = ({ id, round }: Sending): string => linkSecret(`invitation:${id}:${round}`)

/** What a sending stores: the hash of its secret, and how long it opens something. */
export function newLink(sending: Sending): Pick<InvitationRow, 'tokenHash' | 'sentAt' | 'expiresAt'> {
  const sentAt = new Date()
  return { tokenHash: hashSecret(secretOf(sending)), sentAt, expiresAt: new Date(sentAt.getTime() + validDays * 86_400_000) }
}

/** The secret of the stored link. Throws where this process has another key than the one that made it. */
export function linkToken(invitation: InvitationRow): string {
  const token = secretOf(invitation)
  if (hashSecret(token) !== invitation.tokenHash) throw new Error('The secret file "links" differs from the one of the web process; copy the secrets folder to this host.')
  return token
}
