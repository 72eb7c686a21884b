import type { CampaignRole } from '#shared/types/roles'
import { DomainError } from '#shared/utils/domain-error'
import { may } from '#shared/utils/permissions'
import { database } from '../../database/client'
import type { RetrievalRecord } from '../../database/retrievals/claim'
import { findRetrieval } from '../../database/retrievals/read'
import type { Actor } from '../accounts/actor'
import { campaignByIdFor, type CampaignAccess } from '../campaigns/access'

export interface RetrievalAccess extends CampaignAccess { retrieval: RetrievalRecord }

const notFound = () => new DomainError('not_found', 'There is no such retrieval, or it belongs to a campaign that you are not a member of.')

/** The retrieval if the caller may see it; otherwise it is not there. */
export async function retrievalFor(actor: Actor, id: string): Promise<RetrievalAccess> {
  const retrieval = await findRetrieval(database(), id)
  if (!retrieval) throw notFound()
  try {
    return { retrieval, ...await campaignByIdFor(actor, retrieval.campaignId, 'see') }
  }
  catch (error) {
    throw error instanceof DomainError && error.code === 'not_found' ? notFound() : error
  }
}

const isOwn = (actor: Actor, retrieval: RetrievalRecord) => retrieval.ownerId === actor.userId

/** One's own, or anyone's for those who may. */
export const mayChange = (verb: 'abort' | 'revise', actor: Actor, role: CampaignRole, retrieval: RetrievalRecord): boolean =>
  may(role, `${verb}-any`) || (isOwn(actor, retrieval) && may(role, `${verb}-own`))

export const maySubmit = (actor: Actor, role: CampaignRole, retrieval: RetrievalRecord): boolean =>
  may(role, 'submit') && (isOwn(actor, retrieval) || may(role, 'revise-any'))

/** Not one's own submission, unless the campaign allows it. */
export const mayReview = (actor: Actor, { role, campaign, retrieval }: RetrievalAccess): boolean =>
  may(role, 'review') && (!isOwn(actor, retrieval) || campaign.selfReview)

export function refuseUnless(allowed: boolean, message: string): void {
  if (!allowed) throw new DomainError('forbidden', message)
}
