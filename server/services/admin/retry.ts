import type { RetryAnswer } from '#shared/schemas/admin'
import { database, type Transaction } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { startRevision } from '../../database/retrievals/change'
import type { RetrievalRecord } from '../../database/retrievals/claim'
import { insertEvents } from '../../database/retrievals/events'
import { findRetrieval } from '../../database/retrievals/read'
import { takeBack } from '../../database/retrievals/troubled'
import { enqueueRetrievals } from '../../jobs/queue'
import type { Actor } from '../accounts/actor'
import { overlongSeconds } from './queue'

type Order = Parameters<typeof enqueueRetrievals>[0][number]
type Item = RetryAnswer['items'][number]

/** Has retrievals fitted again that the service failed, or whose execution is stuck; each by itself. */
export async function retryRetrievals(actor: Actor, ids: string[]): Promise<RetryAnswer> {
  const items: Item[] = []
  const orders: Order[] = []
  for (const id of new Set(ids)) {
    const outcome = await database().transaction(tx => retryOne(tx, actor, id))
    if (typeof outcome === 'string') items.push({ id, ok: false, message: outcome })
    else {
      items.push({ id, ok: true })
      orders.push(outcome)
    }
  }
  await enqueueRetrievals(orders)
  return { items }
}

/** What to queue, or why not. */
async function retryOne(tx: Transaction, actor: Actor, id: string): Promise<Order | string> {
  const row = await findRetrieval(tx, id)
  if (!row) return 'There is no such retrieval.'
  const revision = row.phase === 'ERROR' ? await asNextRevision(tx, row) : row.phase === 'EXECUTING' ? await again(tx, row) : null
  if (revision === null) return refusalOf(row)
  await insertEvents(tx, [{ retrievalId: id, batchId: row.batchId, revision, phase: 'QUEUED', progress: 0 }])
  await writeLogbook(tx, { campaignId: row.campaignId, objectKind: 'retrieval', objectId: id, actorId: actor.userId, action: 'retry', detail: { revision, phase: row.phase } })
  return { id, revision, dispatch: row.dispatch + 1 }
}

/** A stored result is never changed: the fit is made again as the next revision, under the same settings. */
const asNextRevision = async (tx: Transaction, row: RetrievalRecord): Promise<number | null> =>
  row.fault && await startRevision(tx, row, { settings: row.settings, settingsHash: row.settingsHash, note: 'Fitted again after a fault of the service.' }) ? row.revision + 1 : null

const again = async (tx: Transaction, { id, attempt, revision }: RetrievalRecord): Promise<number | null> =>
  await takeBack(tx, { id, attempt, overlongSeconds: overlongSeconds() }) ? revision : null

function refusalOf({ phase, fault }: RetrievalRecord): string {
  if (phase === 'EXECUTING') return 'A worker is at it and gives signs of life; wait.'
  if (phase === 'ERROR' && !fault) return 'It failed through its own input, so the same fit would fail again. Its owner revises it.'
  return `It is ${phase}: there is nothing to do again.`
}
