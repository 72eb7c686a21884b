import { DomainError } from '#shared/utils/domain-error'
import type { CampaignAction, CampaignRole } from '#shared/types/roles'
import { may } from '#shared/utils/permissions'
import { database } from '../../database/client'
import { findCampaignForMember, listMemberships, type CampaignAccess } from '../../database/campaigns/access-queries'
import type { Actor } from '../accounts/actor'

export type { CampaignAccess, CampaignRow } from '../../database/campaigns/access-queries'

/** The campaign and the caller's role, if the role allows the action. Somebody else's campaign is not found. */
export const campaignFor = (actor: Actor, slug: string, action: CampaignAction): Promise<CampaignAccess> =>
  allowed(findCampaignForMember(database(), { userId: actor.userId, slug }), action)

/** The same by id, for rows that carry one. */
export const campaignByIdFor = (actor: Actor, campaignId: string, action: CampaignAction): Promise<CampaignAccess> =>
  allowed(findCampaignForMember(database(), { userId: actor.userId, campaignId }), action)

/** Ids of all campaigns whose content the caller may see. */
export const visibleCampaignIds = async (actor: Actor): Promise<string[]> =>
  (await listMemberships(database(), actor.userId)).filter(({ role }) => may(role, 'see')).map(({ campaignId }) => campaignId)

/** The caller's role in each of their campaigns, by campaign id. */
export const rolesByCampaign = async (actor: Actor): Promise<Map<string, CampaignRole>> =>
  new Map((await listMemberships(database(), actor.userId)).map(({ campaignId, role }) => [campaignId, role]))

async function allowed(found: Promise<CampaignAccess | undefined>, action: CampaignAction): Promise<CampaignAccess> {
  const access = await found
  if (!access || !may(access.role, 'see')) throw new DomainError('not_found', 'There is no such campaign, or you are not a member of it.')
  if (!may(access.role, action)) throw new DomainError('forbidden', `Your role in this campaign is ${access.role}; it does not allow this (${action}). Ask the campaign's lead.`)
  return access
}
