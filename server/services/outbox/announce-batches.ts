import { findUser } from '../../database/accounts/repository'
import { findBatchesForDigest, markDigested, type BatchRecord } from '../../database/batches/repository'
import { database } from '../../database/client'
import { newId } from '../../database/ids'
import { insertOutbox } from '../../database/outbox/repository'
import { messageIdFor } from './message-id'

const lookBackDays = 30
const batchesAtOnce = 50

/** Puts one digest in the outbox for every batch that has ended. Several processes may try: one gets the batch. */
export async function announceFinishedBatches(): Promise<number> {
  const due = await findBatchesForDigest(database(), new Date(Date.now() - lookBackDays * 86_400_000), batchesAtOnce)
  let announced = 0
  for (const batch of due) if (await announce(batch)) announced++
  return announced
}

const announce = (batch: BatchRecord): Promise<boolean> => database().transaction(async (tx) => {
  if (!await markDigested(tx, batch.id)) return false
  const owner = await findUser(tx, batch.ownerId)
  if (owner?.mailPreference !== 'digest') return false
  const subjectKey = `digest:${batch.id}`
  await insertOutbox(tx, { id: newId(), subjectKey, userId: owner.id, kind: 'digest', payload: { batchId: batch.id }, messageId: messageIdFor(subjectKey) })
  return true
})
