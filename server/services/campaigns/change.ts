import type { CampaignPatch, CampaignView } from '#shared/schemas/campaign'
import { DomainError } from '#shared/utils/domain-error'
import { findCampaignById, updateCampaign, type CampaignRow } from '../../database/campaigns/repository'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from './access'
import { changesBetween } from './changes'
import { campaignView } from './view'

export async function changeCampaign(actor: Actor, slug: string, { version, ...wanted }: CampaignPatch): Promise<CampaignView> {
  const { campaign, role } = await campaignFor(actor, slug, 'edit-campaign')
  const done = await database().transaction(async (tx) => {
    const before = await findCampaignById(tx, campaign.id)
    if (!before || !(await updateCampaign(tx, { id: campaign.id, version, change: wanted }))) return false
    const detail = changesBetween<CampaignRow>(before, wanted)
    await writeLogbook(tx, { campaignId: campaign.id, objectKind: 'campaign', objectId: campaign.id, actorId: actor.userId, action: 'change', detail })
    return true
  })
  const now = await findCampaignById(database(), campaign.id)
  if (!now) throw new DomainError('not_found', 'There is no such campaign.')
  if (!done) throw new DomainError('stale_version', 'Somebody changed this campaign in the meantime. Look at it as it stands now and change it again.', undefined, campaignView(now, role))
  return campaignView(now, role)
}
