import type { AcceptInvitation, InvitationOffer, InvitationOutcome } from '#shared/schemas/invitation'
import { DomainError } from '#shared/utils/domain-error'
import { findUserByEmail, grantAdministration, insertUser, type UserRow } from '../../database/accounts/repository'
import { insertMembership } from '../../database/campaigns/repository'
import { findMember } from '../../database/campaigns/repository-members'
import { database, type Transaction } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { closeAsAccepted, findInvitationByToken, type InvitationToAnswer } from '../../database/invitations/repository'
import type { Actor } from '../accounts/actor'
import { hashPassword } from '../accounts/passwords'
import { hashSecret } from '../accounts/secret-token.mjs'
import { noteInvitation } from './note'
import { stateOf } from './state'

/** What the link offers, for whoever holds it. */
export async function readOffer(token: string): Promise<InvitationOffer> {
  const offer = await waitingInvitation(token)
  const user = await findUserByEmail(database(), offer.invitation.email)
  refuseDeactivated(user)
  const { email, role, asAdministrator, expiresAt } = offer.invitation
  return { email, hasAccount: user !== undefined, campaign: offer.campaign?.title ?? null, role, asAdministrator, invitedBy: offer.invitedByName, expiresAt: expiresAt.toISOString() }
}

/** A new person: the link proves that the address is theirs. */
export async function acceptAsNewPerson({ token, name, password }: AcceptInvitation): Promise<InvitationOutcome> {
  const offer = await waitingInvitation(token)
  const { email, asAdministrator } = offer.invitation
  const known = await findUserByEmail(database(), email)
  refuseDeactivated(known)
  if (known) throw hasAccount(email)
  const passwordHash = await hashPassword(password)
  try {
    return await database().transaction(async tx => accept(tx, offer, await insertUser(tx, { email, name, passwordHash, isAdministrator: asAdministrator })))
  }
  catch (error) {
    throw isDuplicateEntry(error) ? hasAccount(email) : error
  }
}

/** Somebody who has an account, signed in with it. */
export async function joinWithAccount(actor: Actor, token: string): Promise<InvitationOutcome> {
  const offer = await waitingInvitation(token)
  const { email, asAdministrator } = offer.invitation
  if (actor.email !== email) throw new DomainError('forbidden', `This invitation is for ${email}, and you are signed in as ${actor.email}. Sign out, then open the link again.`)
  return database().transaction(async (tx) => {
    if (asAdministrator) await grantAdministration(tx, actor.userId)
    return accept(tx, offer, actor.userId)
  })
}

async function accept(tx: Transaction, { invitation, campaign }: InvitationToAnswer, userId: string): Promise<InvitationOutcome> {
  // Of several that try at once one wins; the others find it used.
  if (!await closeAsAccepted(tx, invitation, userId)) throw used()
  const role = invitation.campaignId && invitation.role ? await becomeMember(tx, invitation.campaignId, userId, invitation.role) : null
  await noteInvitation(tx, userId, { ...invitation, role }, 'join')
  return { email: invitation.email, campaign: campaign?.slug ?? null, role }
}

/** Who is a member by now keeps their role. */
async function becomeMember(tx: Transaction, campaignId: string, userId: string, role: NonNullable<InvitationOutcome['role']>) {
  const member = await findMember(tx, campaignId, userId)
  if (member) return member.role
  await insertMembership(tx, { campaignId, userId, role, createdAt: new Date() })
  return role
}

async function waitingInvitation(token: string): Promise<InvitationToAnswer> {
  const found = await findInvitationByToken(database(), hashSecret(token))
  if (!found) throw new DomainError('not_found', 'This invitation link is unknown, or a newer one was sent in its place. Use the newest mail.')
  const state = stateOf(found.invitation)
  if (state === 'accepted') throw used()
  if (state === 'withdrawn') throw new DomainError('not_found', 'This invitation was withdrawn.')
  if (state === 'expired') throw new DomainError('not_found', `This invitation ended on ${found.invitation.expiresAt.toISOString().slice(0, 10)}. Ask ${found.invitedByName} to send it again.`)
  return found
}

const used = () => new DomainError('not_found', 'This invitation link has been used. If it was you, sign in.')
const hasAccount = (email: string) => new DomainError('conflict', `There is an account with ${email} already. Sign in with it, then open the link again.`)

function refuseDeactivated(user: UserRow | undefined): void {
  if (user?.deactivatedAt) throw new DomainError('conflict', 'The account with this address is deactivated. Ask an administrator to reactivate it, then open the link again.')
}
