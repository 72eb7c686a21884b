import { setTimeout as sleep } from 'node:timers/promises'
import { logger } from '../../logger'

const outageCodes = new Set([
  'ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'EPIPE', 'ENOTFOUND', 'ENOENT_SOCKET', 'PROTOCOL_CONNECTION_LOST', 'PROTOCOL_SEQUENCE_TIMEOUT',
  'ER_SERVER_SHUTDOWN', 'ER_CON_COUNT_ERROR', 'ER_NORMAL_SHUTDOWN', 'ER_QUERY_INTERRUPTED', 'ER_CONNECTION_KILLED', 'ER_ABORTING_CONNECTION',
  'ER_LOCK_DEADLOCK', 'ER_LOCK_WAIT_TIMEOUT', 'ER_CHECKREAD',
])

/** The database could not answer, which says nothing about the work: it is worth asking again. */
export function isDatabaseOutage(error: unknown): boolean {
  for (let cause = error, depth = 0; cause instanceof Error && depth < 8; cause = cause.cause, depth++) {
    if ('code' in cause && outageCodes.has(String(cause.code))) return true
    if (/closed state|Connection lost|Pool is closed/i.test(cause.message)) return true
  }
  return false
}

/** Asks the database until it answers, however long that takes; only a stopping process gives up. */
export async function patiently<T>(work: () => Promise<T>, signal?: AbortSignal): Promise<T> {
  for (let waits = 0; ; waits++) {
    try {
      return await work()
    }
    catch (error) {
      if (!isDatabaseOutage(error) || signal?.aborted) throw error
      if (waits === 0) logger.warn({ reason: (error as Error).message.slice(0, 200) }, 'waiting for the database')
      await sleep(Math.min(100 * 2 ** waits, 2000), undefined, { signal })
    }
  }
}
