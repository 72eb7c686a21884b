import type { CampaignCreate, CampaignView } from '#shared/schemas/campaign'
import { insertCampaign, insertMembership, type CampaignRow } from '../../database/campaigns/repository'
import { findTakenSlugs, isFormerSlugOfAnother } from '../../database/campaigns/repository-slugs'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { freeSlug, slugCandidates, slugOf, slugTaken } from './slug'
import { campaignView } from './view'

/** Whoever begins a campaign leads it. */
export async function createCampaign(actor: Actor, input: CampaignCreate): Promise<CampaignView> {
  const row: CampaignRow = { ...input, id: newId(), slug: input.slug ?? await slugFromTitle(input.title), archivedAt: null, createdAt: new Date(), version: 1 }
  await store(actor, row)
  return campaignView(row, { role: 'lead', member: true })
}

async function slugFromTitle(title: string): Promise<string> {
  const base = slugOf(title) || 'campaign'
  return freeSlug(base, await findTakenSlugs(database(), slugCandidates(base)))
}

async function store(actor: Actor, row: CampaignRow): Promise<void> {
  try {
    await database().transaction(async (tx) => {
      await insertCampaign(tx, row)
      if (await isFormerSlugOfAnother(tx, { slug: row.slug, campaignId: row.id })) throw slugTaken(row.slug)
      await insertMembership(tx, { campaignId: row.id, userId: actor.userId, role: 'lead', createdAt: row.createdAt })
      await writeLogbook(tx, { campaignId: row.id, objectKind: 'campaign', objectId: row.id, actorId: actor.userId, action: 'create', detail: { slug: row.slug, title: row.title } })
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw slugTaken(row.slug)
    throw error
  }
}
