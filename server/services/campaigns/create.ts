import type { CampaignCreate, CampaignView } from '#shared/schemas/campaign'
import { DomainError } from '#shared/utils/domain-error'
import { findCampaignSlugs, insertCampaign, insertMembership, type CampaignRow } from '../../database/campaigns/repository'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { freeSlug, slugOf } from './slug'
import { campaignView } from './view'

/** Whoever begins a campaign leads it. */
export async function createCampaign(actor: Actor, input: CampaignCreate): Promise<CampaignView> {
  const row: CampaignRow = {
    id: newId(),
    slug: input.slug ?? await slugFromTitle(input.title),
    title: input.title,
    kind: input.kind,
    description: input.description,
    selfReview: input.selfReview,
    archivedAt: null,
    createdAt: new Date(),
    version: 1,
  }
  await store(actor, row)
  return campaignView(row, 'lead')
}

async function slugFromTitle(title: string): Promise<string> {
  const base = slugOf(title) || 'campaign'
  const candidates = [base, ...Array.from({ length: 50 }, (_, index) => `${base}-${index + 2}`)]
  return freeSlug(base, await findCampaignSlugs(database(), candidates))
}

async function store(actor: Actor, row: CampaignRow): Promise<void> {
  try {
    await database().transaction(async (tx) => {
      await insertCampaign(tx, row)
      await insertMembership(tx, { campaignId: row.id, userId: actor.userId, role: 'lead', createdAt: row.createdAt })
      await writeLogbook(tx, { campaignId: row.id, objectKind: 'campaign', objectId: row.id, actorId: actor.userId, action: 'create', detail: { slug: row.slug, title: row.title } })
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw new DomainError('conflict', `The address ${row.slug} is taken. Choose another one.`, [{ path: 'slug', message: 'This address is taken.' }])
    throw error
  }
}
