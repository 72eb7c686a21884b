import { Queue } from 'bullmq'
import type { Redis } from 'ioredis'
import { logger } from '../logger'
import { redisConnection } from './connection'
import { fitJobId, fitJobName, fitQueueName, type FitRetrieval } from './definitions/fit-retrieval'

let opened: { redis: Redis, queue: Queue } | undefined

function producer(): { redis: Redis, queue: Queue } {
  if (opened) return opened
  const redis = redisConnection('producer')
  const queue = new Queue(fitQueueName(), { connection: redis, skipWaitingForReady: true, defaultJobOptions: { removeOnComplete: true, removeOnFail: true } })
  queue.on('error', () => { /* the connection reports itself once */ })
  return (opened = { redis, queue })
}

/** Opens the connection early, so that the first submission finds it ready. */
export const openQueue = (): void => void producer()

export async function closeQueue(): Promise<void> {
  const closing = opened
  opened = undefined
  await closing?.queue.close().catch(() => undefined)
  closing?.redis.disconnect()
}

/**
 * Hands committed retrievals to the workers. Never throws and never waits for a dead Redis: what does not get
 * through is found by the reconciling task.
 */
export async function enqueueRetrievals(orders: FitRetrieval[]): Promise<void> {
  if (orders.length === 0) return
  const { redis, queue } = producer()
  try {
    if (redis.status !== 'ready') throw new Error(`Redis is ${redis.status}`)
    await queue.addBulk(orders.map(order => ({ name: fitJobName, data: order, opts: { jobId: fitJobId(order) } })))
  }
  catch (error) {
    logger.warn({ count: orders.length, reason: (error as Error).message }, 'not queued now; the reconciling task will')
  }
}

export const enqueueRetrieval = (order: FitRetrieval): Promise<void> => enqueueRetrievals([order])

/** Which of these orders the queue has never heard of, or has lost. Throws when Redis does not answer. */
export async function unknownToQueue(orders: FitRetrieval[]): Promise<FitRetrieval[]> {
  const { redis, queue } = producer()
  const pipeline = redis.pipeline()
  for (const order of orders) pipeline.exists(queue.toKey(fitJobId(order)))
  const answers = await pipeline.exec() ?? []
  const failed = answers.find(([error]) => error)
  if (failed?.[0]) throw failed[0]
  return orders.filter((_, index) => answers[index]?.[1] === 0)
}
