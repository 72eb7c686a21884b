import { campaignFormSchema, type CampaignPatch, type CampaignView } from '#shared/schemas/campaign'
import { findCampaignById, updateCampaign, type CampaignRow } from '../../database/campaigns/repository'
import { isFormerSlugOfAnother, keepFormerSlug } from '../../database/campaigns/repository-slugs'
import type { Queryable } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import type { Actor } from '../accounts/actor'
import { campaignFor, type CampaignAccess } from './access'
import { changeRow, setArchived, type EditableKind } from './change-row'
import { refuseProblems } from './refuse-problems'
import { slugTaken } from './slug'
import { campaignView } from './view'

export async function changeCampaign(actor: Actor, slug: string, { version, ...wanted }: CampaignPatch): Promise<CampaignView> {
  const access = await campaignFor(actor, slug, 'edit-campaign')
  const { campaign } = access
  if (version === campaign.version) refuseProblems(campaignFormSchema, { ...formOf(campaign), ...wanted })
  try {
    const row = await changeRow(campaigns(access), { actor, campaignId: campaign.id, id: campaign.id }, version, wanted)
    return campaignView(row, access)
  }
  catch (error) {
    if (wanted.slug && isDuplicateEntry(error)) throw slugTaken(wanted.slug)
    throw error
  }
}

export async function archiveCampaign(actor: Actor, slug: string, archived: boolean): Promise<CampaignView> {
  const access = await campaignFor(actor, slug, 'archive')
  const row = await setArchived(campaigns(access), { actor, campaignId: access.campaign.id, id: access.campaign.id }, archived)
  return campaignView(row, access)
}

const campaigns = (access: CampaignAccess): EditableKind<CampaignRow> =>
  ({ kind: 'campaign', read: findCampaignById, update: updateWithSlug(access.campaign.slug), view: row => campaignView(row, access) })

/** Under a new slug the old one goes on leading to the campaign. */
const updateWithSlug = (from: string): EditableKind<CampaignRow>['update'] => async (db: Queryable, to) => {
  if (!await updateCampaign(db, to)) return false
  const { slug } = to.change
  if (slug === undefined || slug === from) return true
  if (await isFormerSlugOfAnother(db, { slug, campaignId: to.id })) throw slugTaken(slug)
  await keepFormerSlug(db, { campaignId: to.id, from, to: slug })
  return true
}

const formOf = ({ slug, title, kind, startsOn, endsOn, description, visibility, selfReview }: CampaignRow) =>
  ({ slug, title, kind, startsOn, endsOn, description, visibility, selfReview })
