import { config } from '../../config'
import { database, type Transaction } from '../../database/client'
import { findInvitationById, type InvitationRow } from '../../database/invitations/repository'
import { invitationMail } from '../../mail/invitation'
import type { MailContent } from '../../mail/transport'
import { putMail } from '../outbox/put-mail'
import { linkToken } from './link'
import { stateOf } from './state'

export const mailInvitation = (tx: Transaction, { id, round, email }: InvitationRow): Promise<void> =>
  putMail(tx, { subjectKey: `invitation:${id}:${round}`, kind: 'invitation', address: email, payload: { invitationId: id, round } })

/** The mail as the invitation stands now; null when it was sent anew, withdrawn or accepted meanwhile. */
export async function writeInvitation(id: string, round: number): Promise<MailContent | null> {
  const found = await findInvitationById(database(), id)
  if (!found || found.invitation.round !== round || stateOf(found.invitation) !== 'waiting') return null
  const { role, asAdministrator, expiresAt } = found.invitation
  return invitationMail({
    invitedBy: found.invitedByName, campaign: found.campaign?.title ?? null, role, asAdministrator, expiresAt,
    link: `${config().origin}/invitations/${linkToken(found.invitation)}`,
  })
}
