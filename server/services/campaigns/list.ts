import type { CampaignView } from '#shared/schemas/campaign'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { roleOf } from '../../database/campaigns/access-queries'
import { countVisibleCampaigns, findVisibleCampaigns } from '../../database/campaigns/repository'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from './access'
import { campaignView } from './view'

export async function listCampaigns(actor: Actor, query: PageQuery): Promise<Page<CampaignView>> {
  const db = database()
  const [rows, total] = await Promise.all([
    findVisibleCampaigns(db, actor.userId, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countVisibleCampaigns(db, actor.userId),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.campaign.id, view: row => campaignView(row.campaign, roleOf(row.role)) })
}

export async function readCampaign(actor: Actor, slug: string): Promise<CampaignView> {
  const access = await campaignFor(actor, slug, 'see')
  return campaignView(access.campaign, access)
}
