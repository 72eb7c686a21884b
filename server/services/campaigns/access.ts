import { DomainError } from '#shared/utils/domain-error'
import type { CampaignAction, CampaignRole } from '#shared/types/roles'
import { may } from '#shared/utils/permissions'
import { mayIn } from '#shared/utils/permissions-in-archive'
import { database } from '../../database/client'
import { findCampaignForMember, listMemberships, listVisibleCampaignIds, type CampaignAccess, type CampaignRow } from '../../database/campaigns/access-queries'
import type { Actor } from '../accounts/actor'

export type { CampaignAccess, CampaignRow } from '../../database/campaigns/access-queries'

/** The campaign and the caller's role, if role and campaign allow the action. Somebody else's campaign is not found. */
export const campaignFor = (actor: Actor, slug: string, action: CampaignAction): Promise<CampaignAccess> =>
  allowed(findCampaignForMember(database(), { userId: actor.userId, slug }), action)

/** The same by id, for rows that carry one. */
export const campaignByIdFor = (actor: Actor, campaignId: string, action: CampaignAction): Promise<CampaignAccess> =>
  allowed(findCampaignForMember(database(), { userId: actor.userId, campaignId }), action)

/** Ids of all campaigns whose content the caller may see. */
export const visibleCampaignIds = (actor: Actor): Promise<string[]> => listVisibleCampaignIds(database(), actor.userId)

/** The caller's role in each of their own campaigns, by campaign id. */
export const rolesByCampaign = async (actor: Actor): Promise<Map<string, CampaignRole>> =>
  new Map((await listMemberships(database(), actor.userId)).map(({ campaignId, role }) => [campaignId, role]))

async function allowed(found: Promise<CampaignAccess | undefined>, action: CampaignAction): Promise<CampaignAccess> {
  const access = await found
  if (!access || !may(access.role, 'see')) throw new DomainError('not_found', 'There is no such campaign, or you are not a member of it.')
  const { campaign, role, member } = access
  if (!may(role, action)) throw new DomainError('forbidden', `${member ? `Your role in this campaign is ${role}; it` : 'You read this campaign without being its member, which'} does not allow this (${action}). Ask the campaign's lead.`)
  if (!mayIn({ role, archivedAt: campaign.archivedAt }, action)) throw archivedCampaign(campaign)
  return access
}

const archivedCampaign = ({ title }: Pick<CampaignRow, 'title'>) =>
  new DomainError('archived', `The campaign "${title}" is archived: it can be read and nothing is added or changed. Its lead can bring it back.`)

/** For deeds that are allowed by another table than the campaign's actions, such as a revision of one's own. */
export function refuseArchivedCampaign(campaign: Pick<CampaignRow, 'title' | 'archivedAt'>): void {
  if (campaign.archivedAt) throw archivedCampaign(campaign)
}
