import { setTimeout as sleep } from 'node:timers/promises'
import { logger } from '../../logger'
import { announceFinishedBatches } from '../../services/outbox/announce-batches'
import { deliverMail } from '../../services/outbox/deliver'
import { beatRunning } from '../../services/retrievals/running'
import { reconcile } from '../../services/retrievals/reconcile'
import { sweep } from '../../services/retrievals/sweep'

const second = 1000
const chores: { name: string, everyMs: number, work: (signal: AbortSignal) => Promise<unknown> }[] = [
  { name: 'heartbeat', everyMs: 2 * second, work: beatRunning },
  { name: 'reconcile', everyMs: 3 * second, work: reconcile },
  { name: 'deliver-mail', everyMs: second, work: deliverMail },
  { name: 'digests', everyMs: 2 * second, work: announceFinishedBatches },
  { name: 'sweep', everyMs: 3600 * second, work: sweep },
]

/** Runs the chores of a worker process, each by itself and never twice at once. */
export function startHousekeeping(): { close: () => Promise<void> } {
  const stopping = new AbortController()
  const loops = chores.map(chore => repeat(chore, stopping.signal))
  return {
    async close() {
      stopping.abort()
      await Promise.all(loops)
    },
  }
}

async function repeat({ name, everyMs, work }: (typeof chores)[number], signal: AbortSignal): Promise<void> {
  let failing = false
  while (!signal.aborted) {
    try {
      await work(signal)
      failing = false
    }
    catch (error) {
      // An outage is said once, not every second.
      if (!failing) logger.warn({ chore: name, reason: (error as Error).message }, 'chore failed; it is tried again')
      failing = true
    }
    await sleep(everyMs, undefined, { signal }).catch(() => undefined)
  }
}
