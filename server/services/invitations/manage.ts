import type { InvitationView } from '#shared/schemas/invitation'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { countInvitations, findInvitation, findInvitations, renewInvitation, withdrawInvitation, type InvitationRow, type ListedInvitation } from '../../database/invitations/repository'
import type { Actor } from '../accounts/actor'
import { newLink } from './link'
import { noteInvitation } from './note'
import { placeFor, type Place } from './place'
import { mailInvitation } from './send'
import { invitationView } from './state'

/** Of a campaign (its slug), or of the service (null); the newest first. */
export async function listInvitations(actor: Actor, slug: string | null, { limit, cursor }: PageQuery): Promise<Page<InvitationView>> {
  const { campaignId } = await placeFor(actor, slug)
  const [rows, total] = await Promise.all([
    findInvitations(database(), campaignId, { before: cursor ?? null, limit: limit + 1 }),
    countInvitations(database(), campaignId),
  ])
  return pageOf(rows, { limit, total, id: row => row.invitation.id, view: invitationView })
}

/** Sends it with a new link that is good for another week; the old one opens nothing any more. */
export async function resendInvitation(actor: Actor, slug: string | null, id: string, round: number): Promise<InvitationView> {
  const place = await placeFor(actor, slug)
  const { invitation } = await openInvitation(place, id)
  const next = { ...invitation, round: round + 1, ...newLink({ id, round: round + 1 }) }
  const done = await database().transaction(async (tx) => {
    if (!await renewInvitation(tx, { id, round }, next)) return false
    await noteInvitation(tx, actor.userId, next, 'invite-again')
    await mailInvitation(tx, next)
    return true
  })
  const now = await findOr404(place, id)
  if (!done) throw new DomainError('stale_version', 'This invitation was sent again or closed by somebody else in the meantime. Look at it as it stands now.', undefined, invitationView(now))
  return invitationView(now)
}

export async function withdraw(actor: Actor, slug: string | null, id: string): Promise<void> {
  const place = await placeFor(actor, slug)
  const { invitation } = await openInvitation(place, id)
  await database().transaction(async (tx) => {
    if (!await withdrawInvitation(tx, id)) throw closed(invitation)
    await noteInvitation(tx, actor.userId, invitation, 'withdraw-invitation')
  })
}

async function findOr404({ campaignId }: Place, id: string): Promise<ListedInvitation> {
  const found = await findInvitation(database(), campaignId, id)
  if (!found) throw new DomainError('not_found', 'There is no such invitation.')
  return found
}

async function openInvitation(place: Place, id: string): Promise<ListedInvitation> {
  const found = await findOr404(place, id)
  if (!found.invitation.openKey) throw closed(found.invitation)
  return found
}

const closed = ({ acceptedAt, email }: InvitationRow) => new DomainError('already_finished', acceptedAt
  ? `${email} has accepted this invitation. Change or remove the member instead.`
  : 'This invitation is withdrawn or accepted already. Invite the address again.')
