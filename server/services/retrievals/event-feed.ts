import { database } from '../../database/client'
import { newestIdOlderThan, readAllEventsAfter, type EventRow } from '../../database/retrievals/events'
import { logger } from '../../logger'
import { countSettled, patienceMs } from './settled'

const everyMs = 300
const rowsAtOnce = 5000

type Listener = (rows: EventRow[]) => void
export interface Listening {
  /** Every event up to this id is there to be read; the listener hears of those after it, in order. */
  after: number
  stop: () => void
}

const listeners = new Set<Listener>()
let running = false
/** All up to here has been told. Null until the database has been asked. */
let told: number | null = null
const waiting: (() => void)[] = []

/** Hears of every event from now on. One poller serves all listeners of this process, and rests while there is none. */
export async function listen(listener: Listener): Promise<Listening> {
  let after: number | null = null
  const hear = (rows: EventRow[]) => {
    if (after !== null) listener(rows)
  }
  listeners.add(hear)
  if (!running) void poll()
  while (told === null) await new Promise<void>(done => waiting.push(done))
  after = told
  return { after, stop: () => void listeners.delete(hear) }
}

async function poll(): Promise<void> {
  running = true
  let failing = false
  while (listeners.size > 0) {
    try {
      await look()
      failing = false
    }
    catch (error) {
      if (!failing) logger.warn({ reason: (error as Error).message.slice(0, 200) }, 'events cannot be read now')
      failing = true
    }
    await new Promise(done => setTimeout(done, everyMs).unref())
  }
  running = false
  told = null
}

async function look(): Promise<void> {
  // What is older than the patience has no open gap below it.
  told ??= await newestIdOlderThan(database(), patienceMs)
  for (const ready of waiting.splice(0)) ready()
  for (;;) {
    const rows = await readAllEventsAfter(database(), told, rowsAtOnce)
    const settled = rows.slice(0, countSettled(rows, told))
    if (settled.length === 0) return
    told = settled.at(-1)!.id
    for (const listener of listeners) listener(settled)
    if (rows.length < rowsAtOnce) return
  }
}
