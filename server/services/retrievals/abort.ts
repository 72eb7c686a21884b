import { isFinal, type Phase } from '#shared/types/phases'
import { DomainError } from '#shared/utils/domain-error'
import { database, type Transaction } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { abortIdle, requestAbort } from '../../database/retrievals/change'
import type { RetrievalRecord } from '../../database/retrievals/claim'
import { insertEvents } from '../../database/retrievals/events'
import { insertResult } from '../../database/retrievals/finish'
import { findRetrieval } from '../../database/retrievals/read'
import type { Actor } from '../accounts/actor'
import { announceAbort } from '../outbox/announce-result'
import { mayChange, refuseUnless, retrievalFor } from './access'

/** A claim may come between our look and our change; then we look again. */
const tries = 5

/** Ends a retrieval in whatever phase it is: at once if nobody executes it, otherwise at the executing worker's next look. */
export async function abortRetrieval(actor: Actor, id: string): Promise<{ id: string, phase: Phase }> {
  const { retrieval, role } = await retrievalFor(actor, id)
  refuseUnless(mayChange('abort', actor, role, retrieval), 'You may abort your own retrievals; those of others are aborted by an analyst or the lead.')
  for (let left = tries; left > 0; left--) {
    const row = await findRetrieval(database(), id)
    if (!row || isFinal(row.phase)) throw new DomainError('already_finished', 'This retrieval has ended already; there is nothing to abort.')
    if (await database().transaction(tx => abortAs(tx, actor, row))) return { id, phase: row.phase === 'EXECUTING' ? 'EXECUTING' : 'ABORTED' }
  }
  throw new DomainError('conflict', 'The retrieval changes faster than it can be aborted; try again.')
}

async function abortAs(tx: Transaction, actor: Actor, row: RetrievalRecord): Promise<boolean> {
  const { id, revision, campaignId, phase } = row
  const reason = `Aborted by ${actor.name}.`
  const done = phase === 'EXECUTING' ? await requestAbort(tx, row, reason) : await abortIdle(tx, row, reason)
  if (!done) return false
  await writeLogbook(tx, { campaignId, objectKind: 'retrieval', objectId: id, actorId: actor.userId, action: 'abort', detail: { revision, phase } })
  await announceAbort(tx, actor, id)
  if (phase === 'EXECUTING') return true
  await insertResult(tx, { retrievalId: id, revision, attempt: row.attempt, phase: 'ABORTED', settings: row.settings, result: null, provenance: null, reason, note: row.note, createdBy: row.ownerId, createdAt: new Date() })
  await insertEvents(tx, [{ retrievalId: id, batchId: row.batchId, revision, phase: 'ABORTED', progress: row.progress }])
  return true
}
