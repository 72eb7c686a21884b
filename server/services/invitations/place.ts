import { DomainError } from '#shared/utils/domain-error'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'

/** To what one invites: a campaign that one leads, or (null) the service, for administrators. */
export interface Place { campaignId: string | null, words: string }

export async function placeFor(actor: Actor, slug: string | null): Promise<Place> {
  if (slug === null) {
    if (!actor.isAdministrator) throw new DomainError('forbidden', 'This is for administrators of the service.')
    return { campaignId: null, words: 'this service' }
  }
  const { campaign } = await campaignFor(actor, slug, 'manage-members')
  return { campaignId: campaign.id, words: 'this campaign' }
}
