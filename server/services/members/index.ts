import type { MemberView } from '#shared/schemas/campaign'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { CampaignRole } from '#shared/types/roles'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countMembers, deleteMembership, findMember, findMembers, lockCampaigns, updateRole, type MemberRow } from '../../database/campaigns/repository-members'
import { database, type Transaction } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor, type CampaignRow } from '../campaigns/access'
import { refuseLastLead } from './last-lead'
import { tellMember } from './tell'
import { memberView } from './view'

/** Who reads a campaign without belonging to it sees names and roles; e-mail addresses are for members. */
export async function listMembers(actor: Actor, slug: string, query: PageQuery): Promise<Page<MemberView>> {
  const { campaign, member } = await campaignFor(actor, slug, 'see')
  const [rows, total] = await Promise.all([
    findMembers(database(), campaign.id, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countMembers(database(), campaign.id),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.userId, view: row => member ? memberView(row) : { ...memberView(row), email: '' } })
}

export async function changeRole(actor: Actor, slug: string, userId: string, { role, version }: { role: CampaignRole, version: number }): Promise<MemberView> {
  const { campaign } = await campaignFor(actor, slug, 'manage-members')
  return database().transaction(async (tx) => {
    const member = await lockedMember(tx, campaign.id, userId)
    if (member.version !== version) throw stale(member)
    if (member.role === role) return memberView(member)
    if (member.role === 'lead') await refuseLastLead(tx, campaign.id, userId)
    await updateRole(tx, { campaignId: campaign.id, userId, version }, role)
    await note(tx, actor, campaign, 'change-role', { member: member.name, from: member.role, to: role })
    if (userId !== actor.userId) await tellMember(tx, campaign, userId, { what: 'role', from: member.role, to: role, by: actor.name })
    return memberView({ ...member, role, version: version + 1 })
  })
}

/** What they submitted stays, under their name. */
export async function removeMember(actor: Actor, slug: string, userId: string, version: number): Promise<void> {
  const { campaign } = await campaignFor(actor, slug, 'manage-members')
  await database().transaction(async (tx) => {
    const member = await lockedMember(tx, campaign.id, userId)
    if (member.version !== version) throw stale(member)
    await end(tx, campaign, member)
    await note(tx, actor, campaign, userId === actor.userId ? 'leave' : 'remove-member', { member: member.name, role: member.role })
    if (userId !== actor.userId) await tellMember(tx, campaign, userId, { what: 'removed', by: actor.name })
  })
}

export async function leaveCampaign(actor: Actor, slug: string): Promise<void> {
  const { campaign } = await campaignFor(actor, slug, 'see')
  await database().transaction(async (tx) => {
    const member = await lockedMember(tx, campaign.id, actor.userId)
    await end(tx, campaign, member)
    await note(tx, actor, campaign, 'leave', { member: member.name, role: member.role })
  })
}

async function lockedMember(tx: Transaction, campaignId: string, userId: string): Promise<MemberRow> {
  await lockCampaigns(tx, [campaignId])
  const member = await findMember(tx, campaignId, userId)
  if (!member) throw new DomainError('not_found', 'This person is not a member of the campaign, or is no longer one.')
  return member
}

async function end(tx: Transaction, campaign: CampaignRow, { userId, role, version }: MemberRow): Promise<void> {
  if (role === 'lead') await refuseLastLead(tx, campaign.id, userId)
  if (!await deleteMembership(tx, { campaignId: campaign.id, userId, version })) throw new DomainError('conflict', 'The list of members changed at the same moment; try again.')
}

const stale = (member: MemberRow) =>
  new DomainError('stale_version', `Somebody changed the role of ${member.name} in the meantime: it is ${member.role} now. Look at it and change it again.`, undefined, memberView(member))

const note = (tx: Transaction, actor: Actor, { id }: CampaignRow, action: string, detail: Record<string, unknown>): Promise<void> =>
  writeLogbook(tx, { campaignId: id, objectKind: 'campaign', objectId: id, actorId: actor.userId, action, detail })
