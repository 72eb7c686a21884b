import { Worker } from 'bullmq'
import { config } from '../config'
import { logger } from '../logger'
import { redisConnection } from './connection'
import { fitQueueName, fitRetrievalPayload } from './definitions/fit-retrieval'
import { startHousekeeping } from './handlers/housekeeping'

/** Jobs that are running get this long to end by themselves before they are asked to stop. */
const drainMs = 15_000

/** Starts fitting and looking after. @returns how to end it: running fits end or go back, nothing new begins */
export function startWorker(): { close: () => Promise<void> } {
  const stopping = new AbortController()
  const redis = redisConnection('worker')
  // Loaded while the connection opens, so that the first job does not wait for it.
  const handler = import('./handlers/fit-retrieval')
  const worker = new Worker(fitQueueName(), async (job) => {
    const { fitRetrieval } = await handler
    await fitRetrieval(fitRetrievalPayload.parse(job.data), stopping.signal)
  }, { connection: redis, concurrency: config().workerConcurrency, lockDuration: 10_000, stalledInterval: 5_000, maxStalledCount: 5, drainDelay: 1 })
  worker.on('error', error => logger.warn({ reason: error.message }, 'queue worker'))
  worker.on('failed', (job, error) => logger.warn({ job: job?.id, reason: error.message }, 'job ended without an answer; it will be dispatched again'))
  const housekeeping = startHousekeeping()

  return {
    async close() {
      const stopLate = setTimeout(() => stopping.abort(), drainMs)
      await Promise.all([worker.close(), housekeeping.close()])
      clearTimeout(stopLate)
      stopping.abort()
      redis.disconnect()
    },
  }
}
