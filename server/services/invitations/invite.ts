import type { InvitationView, InviteToCampaign, InviteToService } from '#shared/schemas/invitation'
import { DomainError } from '#shared/utils/domain-error'
import { findUserByEmail } from '../../database/accounts/repository'
import { findMember } from '../../database/campaigns/repository-members'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { insertInvitation, type InvitationRow } from '../../database/invitations/repository'
import type { Actor } from '../accounts/actor'
import { noteInvitation } from './note'
import { newLink } from './link'
import { placeFor, type Place } from './place'
import { mailInvitation } from './send'
import { invitationView } from './state'

/** Asks an address into a campaign. The answer is the same whether the address has an account or not. */
export async function inviteToCampaign(actor: Actor, slug: string, { email, role }: InviteToCampaign): Promise<InvitationView> {
  const place = await placeFor(actor, slug)
  await refuseMember(place, email)
  return invite(actor, place, { email, role, asAdministrator: false })
}

export async function inviteToService(actor: Actor, { email, asAdministrator }: InviteToService): Promise<InvitationView> {
  return invite(actor, await placeFor(actor, null), { email, role: null, asAdministrator })
}

/** Members see who else is one, with the address: this tells nothing new. */
async function refuseMember({ campaignId }: Place, email: string): Promise<void> {
  const user = await findUserByEmail(database(), email)
  if (campaignId && user && await findMember(database(), campaignId, user.id)) {
    throw new DomainError('conflict', `${email} is a member of this campaign already. Change their role in the list of members.`, [{ path: 'email', message: 'This address is a member already.' }])
  }
}

async function invite(actor: Actor, place: Place, wanted: Pick<InvitationRow, 'email' | 'role' | 'asAdministrator'>): Promise<InvitationView> {
  const id = newId()
  const row: InvitationRow = {
    id, campaignId: place.campaignId, ...wanted, round: 1, ...newLink({ id, round: 1 }), openKey: `${place.campaignId ?? 'service'}:${wanted.email}`,
    invitedBy: actor.userId, createdAt: new Date(), acceptedAt: null, acceptedBy: null, withdrawnAt: null,
  }
  try {
    await database().transaction(async (tx) => {
      await insertInvitation(tx, row)
      await noteInvitation(tx, actor.userId, row, 'invite')
      await mailInvitation(tx, row)
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw new DomainError('conflict', `${wanted.email} has been invited to ${place.words} already. Send that invitation again, or withdraw it first.`, [{ path: 'email', message: 'This address has been invited already.' }])
    throw error
  }
  return invitationView({ invitation: row, invitedByName: actor.name })
}
