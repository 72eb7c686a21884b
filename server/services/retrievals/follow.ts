import { isFinal } from '#shared/types/phases'
import type { BatchCounts, RetrievalEvent } from '#shared/types/retrieval'
import { database } from '../../database/client'
import { readEventsAfter, type EventRow, type EventScope } from '../../database/retrievals/events'
import type { Actor } from '../accounts/actor'
import { batchCounts } from '../batches/index'
import { retrievalFor } from './access'
import { listen } from './event-feed'

export interface FollowedEvent { id: number, kind: 'phase' | 'progress', data: RetrievalEvent }
export interface Followed {
  /** Asks again whether the caller may see it, and whether all has ended. */
  ask: (actor: Actor) => Promise<BatchCounts>
  /** Replays what came after an id, then tells what comes; returns how to stop. */
  start: (afterId: number, tell: (events: FollowedEvent[]) => void) => Promise<() => void>
}

/** A batch, or one retrieval, as something that can be followed. */
export async function followBatch(actor: Actor, batchId: string): Promise<Followed> {
  await batchCounts(actor, batchId)
  return { ask: asker => batchCounts(asker, batchId), start: (afterId, tell) => start({ batchId }, afterId, tell) }
}

export async function followRetrieval(actor: Actor, retrievalId: string): Promise<Followed> {
  await retrievalFor(actor, retrievalId)
  return { ask: asker => countsOfOne(asker, retrievalId), start: (afterId, tell) => start({ retrievalId }, afterId, tell) }
}

async function countsOfOne(actor: Actor, id: string): Promise<BatchCounts> {
  const { retrieval, campaign } = await retrievalFor(actor, id)
  const { batchId, createdAt, phase } = retrieval
  return { id: batchId, campaign: campaign.slug, createdAt: createdAt.toISOString(), total: 1, byPhase: { [phase]: 1 }, done: isFinal(phase) }
}

const rowsAtOnce = 1000

async function start(scope: EventScope, afterId: number, tell: (events: FollowedEvent[]) => void): Promise<() => void> {
  const told = new Set<number>()
  let replaying = true
  const held: EventRow[] = []
  const pass = (rows: EventRow[]) => {
    const fresh = rows.filter(row => !told.has(row.id))
    for (const row of fresh) told.add(row.id)
    if (fresh.length > 0) tell(fresh.map(toEvent))
  }
  const stop = listen((rows) => {
    const ours = rows.filter(row => row.id > afterId && ('batchId' in scope ? row.batchId === scope.batchId : row.retrievalId === scope.retrievalId))
    if (replaying) held.push(...ours)
    else pass(ours)
  })
  try {
    for (let after = afterId; ;) {
      const rows = await readEventsAfter(database(), scope, after, rowsAtOnce)
      pass(rows)
      if (rows.length < rowsAtOnce) break
      after = rows.at(-1)!.id
    }
  }
  catch (error) {
    stop()
    throw error
  }
  replaying = false
  pass(held)
  return stop
}

const toEvent = ({ id, kind, retrievalId, revision, phase, progress, at }: EventRow): FollowedEvent =>
  ({ id, kind, data: { retrievalId, revision, phase, progress, at: at.toISOString() } })
