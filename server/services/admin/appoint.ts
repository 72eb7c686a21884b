import { DomainError } from '#shared/utils/domain-error'
import { findMember, updateRole } from '../../database/campaigns/repository-members'
import type { Transaction } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { tellMember } from '../members/tell'

/** Makes a member the lead of a campaign whose only lead goes. */
export async function appoint(tx: Transaction, actor: Actor, campaign: { id: string, slug: string, title: string }, before: { id: string, name: string }, userId: string): Promise<void> {
  const member = await findMember(tx, campaign.id, userId)
  if (!member || member.deactivatedAt || userId === before.id) {
    throw new DomainError('validation_failed', `Name an active member of ${campaign.title} as its next lead.`, [{ path: `successors.${campaign.slug}`, message: 'This is not an active member of the campaign.' }])
  }
  await updateRole(tx, { campaignId: campaign.id, userId, version: member.version }, 'lead')
  await writeLogbook(tx, { campaignId: campaign.id, objectKind: 'campaign', objectId: campaign.id, actorId: actor.userId, action: 'appoint-lead', detail: { member: member.name, from: member.role, to: 'lead', instead: before.name } })
  await tellMember(tx, campaign, userId, { what: 'appointed', by: actor.name })
}
