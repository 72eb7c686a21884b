import { isFinal } from '#shared/types/phases'
import type { BatchCounts, RetrievalEvent } from '#shared/types/retrieval'
import { database } from '../../database/client'
import { readEventsBetween, type EventRow, type EventScope } from '../../database/retrievals/events'
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
  /** What came after an id. Complete once all has ended: phases and their events are committed together. */
  rest: (afterId: number) => Promise<FollowedEvent[]>
}

/** A batch, or one retrieval, as something that can be followed. */
export async function followBatch(actor: Actor, batchId: string): Promise<Followed> {
  await batchCounts(actor, batchId)
  return following({ batchId }, asker => batchCounts(asker, batchId))
}

export async function followRetrieval(actor: Actor, retrievalId: string): Promise<Followed> {
  await retrievalFor(actor, retrievalId)
  return following({ retrievalId }, asker => countsOfOne(asker, retrievalId))
}

const following = (scope: EventScope, ask: Followed['ask']): Followed => ({
  ask,
  start: (afterId, tell) => start(scope, afterId, tell),
  rest: async (afterId) => {
    const rest: FollowedEvent[] = []
    await replay(scope, afterId, Number.MAX_SAFE_INTEGER, rows => void rest.push(...rows.map(toEvent)))
    return rest
  },
})

async function countsOfOne(actor: Actor, id: string): Promise<BatchCounts> {
  const { retrieval, campaign } = await retrievalFor(actor, id)
  const { batchId, createdAt, phase } = retrieval
  return { id: batchId, campaign: campaign.slug, createdAt: createdAt.toISOString(), total: 1, byPhase: { [phase]: 1 }, done: isFinal(phase) }
}

const rowsAtOnce = 1000

async function start(scope: EventScope, afterId: number, tell: (events: FollowedEvent[]) => void): Promise<() => void> {
  let replaying = true
  const held: EventRow[] = []
  const pass = (rows: EventRow[]) => {
    if (rows.length > 0) tell(rows.map(toEvent))
  }
  const { after, stop } = await listen((rows) => {
    const ours = rows.filter(row => row.id > afterId && ('batchId' in scope ? row.batchId === scope.batchId : row.retrievalId === scope.retrievalId))
    if (replaying) held.push(...ours)
    else pass(ours)
  })
  try {
    await replay(scope, afterId, after, pass)
  }
  catch (error) {
    stop()
    throw error
  }
  replaying = false
  pass(held)
  return stop
}

async function replay(scope: EventScope, afterId: number, upToId: number, pass: (rows: EventRow[]) => void): Promise<void> {
  for (let after = afterId; ;) {
    const rows = await readEventsBetween(database(), scope, after, upToId, rowsAtOnce)
    pass(rows)
    if (rows.length < rowsAtOnce) return
    after = rows.at(-1)!.id
  }
}

const toEvent = ({ id, kind, retrievalId, revision, phase, progress, at }: EventRow): FollowedEvent =>
  ({ id, kind, data: { retrievalId, revision, phase, progress, at: at.toISOString() } })
