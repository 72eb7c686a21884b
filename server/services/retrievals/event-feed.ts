import { database } from '../../database/client'
import { newestEventId, readAllEventsAfter, type EventRow } from '../../database/retrievals/events'
import { logger } from '../../logger'

const everyMs = 300
/** Ids are given before commits: a smaller id may appear after a larger one, but hardly later than this. */
const overlapMs = 5000
const rowsAtOnce = 5000

type Listener = (rows: EventRow[]) => void

const listeners = new Set<Listener>()
let polling: Promise<void> | undefined

/** Hears of every event from now on. One poller serves all listeners of this process, and rests while there is none. */
export function listen(listener: Listener): () => void {
  listeners.add(listener)
  polling ??= poll().finally(() => {
    polling = undefined
  })
  return () => void listeners.delete(listener)
}

async function poll(): Promise<void> {
  const seen = new Map<number, number>()
  let floor: number | null = null
  let failing = false
  while (listeners.size > 0) {
    try {
      floor ??= Math.max(0, await newestEventId(database()) - 200)
      const fresh = await unseen(floor, seen)
      floor = forgetOld(seen, floor)
      if (fresh.length > 0) for (const listener of listeners) listener(fresh)
      failing = false
    }
    catch (error) {
      if (!failing) logger.warn({ reason: (error as Error).message.slice(0, 200) }, 'events cannot be read now')
      failing = true
    }
    await new Promise(done => setTimeout(done, everyMs).unref())
  }
}

async function unseen(floor: number, seen: Map<number, number>): Promise<EventRow[]> {
  const now = Date.now()
  const fresh: EventRow[] = []
  for (let after = floor; ;) {
    const rows = await readAllEventsAfter(database(), after, rowsAtOnce)
    fresh.push(...rows.filter(row => !seen.has(row.id)))
    if (rows.length < rowsAtOnce) break
    after = rows.at(-1)!.id
  }
  for (const row of fresh) seen.set(row.id, now)
  return fresh
}

/** Everything at or below the new floor has been seen for so long that nothing can still appear there. */
function forgetOld(seen: Map<number, number>, floor: number): number {
  const old = Date.now() - overlapMs
  let highest = floor
  for (const [id, at] of seen) {
    if (at >= old) continue
    seen.delete(id)
    highest = Math.max(highest, id)
  }
  for (const id of seen.keys()) if (id <= highest) seen.delete(id)
  return highest
}
