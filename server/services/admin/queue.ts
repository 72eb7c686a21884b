import type { QueueView, Troubled } from '#shared/schemas/admin'
import { config } from '../../config'
import { database } from '../../database/client'
import { countByPhase, countTroubled, findTroubled, oldestQueuedAt, type TroubledRow } from '../../database/retrievals/troubled'
import { queueNumbers } from '../../jobs/queue'

const shown = 200

/** All that one process has in hand may have waited for its one thread. */
export const overlongSeconds = (): number => config().limits.fitSeconds * (config().workerConcurrency + 1)

export async function readQueue(): Promise<QueueView> {
  const db = database()
  const [queue, byPhase, oldest, rows, total] = await Promise.all([
    queueNumbers().catch(() => null),
    countByPhase(db),
    oldestQueuedAt(db),
    findTroubled(db, { overlongSeconds: overlongSeconds(), limit: shown }),
    countTroubled(db, overlongSeconds()),
  ])
  return { queue, byPhase, oldestQueuedAt: oldest?.toISOString() ?? null, troubled: { items: rows.map(troubledView), total } }
}

function troubledView({ id, campaign, phase, reason, attempt, attemptsBefore, startedAt, finishedAt, heartbeatAt, isSilent }: TroubledRow): Troubled {
  const trouble = phase === 'ERROR' ? 'fault' : isSilent ? 'silent' : 'overlong'
  const since = { fault: finishedAt, silent: heartbeatAt ?? startedAt, overlong: startedAt }[trouble]
  return { id, campaign, phase, trouble, since: since?.toISOString() ?? null, attempts: attempt - attemptsBefore, reason: trouble === 'fault' ? reason : null }
}
