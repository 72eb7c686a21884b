import { Queue } from 'bullmq'
import type { Redis } from 'ioredis'
import { logger } from '../logger'
import { redisConnection } from './connection'
import { fitJobId, fitJobName, fitQueueName, type FitRetrieval } from './definitions/fit-retrieval'

let connection: Redis | undefined
let queue: Queue | undefined

const redis = (): Redis => (connection ??= redisConnection('producer'))

/** BullMQ keeps the failure of its first command for good, so it meets the connection only once that is ready. */
function readyQueue(): Queue {
  const { status } = redis()
  if (status !== 'ready') throw new Error(`Redis is ${status}`)
  if (queue) return queue
  queue = new Queue(fitQueueName(), { connection: redis(), skipWaitingForReady: true, defaultJobOptions: { removeOnComplete: true, removeOnFail: true } })
  queue.on('error', () => { /* the connection reports itself once */ })
  return queue
}

/** Opens the connection early, so that the first submission finds it ready. */
export const openQueue = (): void => void redis()

export async function closeQueue(): Promise<void> {
  await queue?.close().catch(() => undefined)
  connection?.disconnect()
  queue = undefined
  connection = undefined
}

/**
 * Hands committed retrievals to the workers. Never throws and never waits for a dead Redis: what does not get
 * through is found by the reconciling task.
 */
export async function enqueueRetrievals(orders: FitRetrieval[]): Promise<void> {
  if (orders.length === 0) return
  try {
    await readyQueue().addBulk(orders.map(order => ({ name: fitJobName, data: order, opts: { jobId: fitJobId(order) } })))
  }
  catch (error) {
    logger.warn({ count: orders.length, reason: (error as Error).message }, 'not queued now; the reconciling task will')
  }
}

export const enqueueRetrieval = (order: FitRetrieval): Promise<void> => enqueueRetrievals([order])

/** Which of these orders the queue has never heard of, or has lost. Throws when Redis does not answer. */
export async function unknownToQueue(orders: FitRetrieval[]): Promise<FitRetrieval[]> {
  const known = readyQueue()
  const pipeline = redis().pipeline()
  for (const order of orders) pipeline.exists(known.toKey(fitJobId(order)))
  const answers = await pipeline.exec() ?? []
  const failed = answers.find(([error]) => error)
  if (failed?.[0]) throw failed[0]
  return orders.filter((_, index) => answers[index]?.[1] === 0)
}

const states = ['waiting', 'active', 'delayed', 'failed'] as const
export interface QueueNumbers { jobs: Record<(typeof states)[number], number>, workers: number }

/** How the queue stands now. Throws when Redis does not answer. */
export async function queueNumbers(): Promise<QueueNumbers> {
  const known = readyQueue()
  const [counts, workers] = await Promise.all([known.getJobCounts(...states), known.getWorkersCount()])
  return { jobs: Object.fromEntries(states.map(state => [state, counts[state] ?? 0])) as QueueNumbers['jobs'], workers }
}
