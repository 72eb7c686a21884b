import { isFinal, type Phase } from '#shared/types/phases'
import type { BatchCounts } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countPhases, findBatch, type BatchRecord } from '../../database/batches/repository'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignByIdFor } from '../campaigns/access'

/** The batch if the caller may see its campaign; otherwise it is not there. */
export async function batchCounts(actor: Actor, id: string): Promise<BatchCounts> {
  const batch = await findBatch(database(), id)
  if (!batch) throw new DomainError('not_found', 'There is no such batch, or it belongs to a campaign that you are not a member of.')
  const { campaign } = await campaignByIdFor(actor, batch.campaignId, 'see')
  return countsOf(batch, campaign.slug)
}

async function countsOf(batch: BatchRecord, campaign: string): Promise<BatchCounts> {
  const byPhase = await countPhases(database(), batch.id)
  const done = Object.keys(byPhase).every(phase => isFinal(phase as Phase))
  return { id: batch.id, campaign, createdAt: batch.createdAt.toISOString(), total: batch.total, byPhase, done }
}
