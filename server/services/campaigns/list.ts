import type { CampaignView } from '#shared/schemas/campaign'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { countCampaignsOfUser, findCampaignsOfUser } from '../../database/campaigns/repository'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from './access'
import { campaignView } from './view'

export async function listCampaigns(actor: Actor, query: PageQuery): Promise<Page<CampaignView>> {
  const db = database()
  const [rows, total] = await Promise.all([
    findCampaignsOfUser(db, actor.userId, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countCampaignsOfUser(db, actor.userId),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.campaign.id, view: row => campaignView(row.campaign, row.role) })
}

export async function readCampaign(actor: Actor, slug: string): Promise<CampaignView> {
  const { campaign, role } = await campaignFor(actor, slug, 'see')
  return campaignView(campaign, role)
}
