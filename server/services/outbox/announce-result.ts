import type { MailPreference } from '#shared/types/roles'
import type { Transaction } from '../../database/client'
import { newId } from '../../database/ids'
import { insertOutbox } from '../../database/outbox/repository'
import { readClaimed, type ClaimedRetrieval } from '../../database/retrievals/claim'
import type { Actor } from '../accounts/actor'
import { messageIdFor } from './message-id'

interface Announced { mailPreference: MailPreference, batchTotal: number, batchDigestAt: Date | null, revision: number }

/** A result of a batch waits for the batch's digest, unless it was asked for by itself: a revision, or what was submitted after the digest. */
export function wantsOwnMail({ mailPreference, batchTotal, batchDigestAt, revision }: Announced): boolean {
  if (mailPreference === 'none') return false
  return mailPreference === 'each' || batchTotal === 1 || revision > 1 || batchDigestAt !== null
}

/** Puts the mail about a result in the outbox, in the transaction of that result. */
export async function announceResult(tx: Transaction, claimed: ClaimedRetrieval, phase: 'COMPLETED' | 'ERROR'): Promise<void> {
  const { id, revision, ownerId } = claimed.retrieval
  if (!wantsOwnMail({ ...claimed, revision })) return
  const subjectKey = `result:${id}:${revision}`
  await insertOutbox(tx, {
    id: newId(), subjectKey, userId: ownerId, kind: phase === 'COMPLETED' ? 'result' : 'failure',
    payload: { retrievalId: id, revision }, messageId: messageIdFor(subjectKey),
  })
}

/** Tells the owner that somebody else aborted; what one aborts oneself one knows. */
export async function announceAbort(tx: Transaction, actor: Actor, id: string): Promise<void> {
  const aborted = await readClaimed(tx, id)
  if (!aborted || aborted.retrieval.ownerId === actor.userId || !wantsOwnMail({ ...aborted, revision: aborted.retrieval.revision })) return
  const { revision, ownerId } = aborted.retrieval
  const subjectKey = `abort:${id}:${revision}`
  await insertOutbox(tx, { id: newId(), subjectKey, userId: ownerId, kind: 'failure', payload: { retrievalId: id, revision, abortedBy: actor.name }, messageId: messageIdFor(subjectKey) })
}
