import type { ReviewRetrieval } from '#shared/schemas/retrieval-submit'
import { DomainError } from '#shared/utils/domain-error'
import { may } from '#shared/utils/permissions'
import { database } from '../../database/client'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import { insertReview, setVerdict } from '../../database/retrievals/change'
import type { Actor } from '../accounts/actor'
import { refuseArchivedCampaign } from '../campaigns/access'
import { mayReview, refuseUnless, retrievalFor } from './access'

/** A second person's verdict on a result. */
export async function reviewRetrieval(actor: Actor, id: string, { verdict, note }: ReviewRetrieval): Promise<{ id: string, verdict: 'accept' | 'return' }> {
  const access = await retrievalFor(actor, id)
  const { retrieval } = access
  refuseUnless(may(access.role, 'review'), 'Results are reviewed by an analyst or the lead.')
  refuseUnless(mayReview(actor, access), 'In this campaign nobody reviews a submission of their own; ask another analyst or the lead.')
  refuseArchivedCampaign(access.campaign)
  await database().transaction(async (tx) => {
    if (!await setVerdict(tx, retrieval, verdict)) throw new DomainError('wrong_phase', `Only a completed retrieval can be reviewed; this one is ${retrieval.phase}.`)
    await insertReview(tx, { id: newId(), retrievalId: id, revision: retrieval.revision, reviewerId: actor.userId, verdict, note, createdAt: new Date() })
    await writeLogbook(tx, { campaignId: retrieval.campaignId, objectKind: 'retrieval', objectId: id, actorId: actor.userId, action: 'review', detail: { revision: retrieval.revision, verdict, note } })
  })
  return { id, verdict }
}
