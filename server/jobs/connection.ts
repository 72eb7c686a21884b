import { Redis } from 'ioredis'
import { config } from '../config'
import { logger } from '../logger'

/**
 * A connection to Redis. A producer fails fast, so that a submission never waits for a dead Redis;
 * a worker waits as long as it takes (BullMQ wants maxRetriesPerRequest null for it).
 */
export function redisConnection(kind: 'producer' | 'worker'): Redis {
  const redis = new Redis(config().redisUrl, {
    maxRetriesPerRequest: kind === 'worker' ? null : 1,
    enableOfflineQueue: kind === 'worker',
    connectTimeout: 2000,
    ...(kind === 'producer' ? { commandTimeout: 2000 } : {}),
    retryStrategy: attempt => Math.min(100 * 2 ** Math.min(attempt, 6), 5000),
  })
  let down = false
  redis.on('error', (error) => {
    if (!down) logger.warn({ reason: error.message || String(error), kind }, 'Redis is not reachable')
    down = true
  })
  redis.on('ready', () => {
    down = false
  })
  return redis
}

/** Waits a moment for a connection that is just being made; a producer's commands fail until then. */
export async function settled(redis: Redis, patienceMs = 500): Promise<void> {
  if (redis.status !== 'connecting' && redis.status !== 'connect') return
  await new Promise<void>((resolve) => {
    const timer = setTimeout(resolve, patienceMs)
    for (const event of ['ready', 'error', 'close']) {
      redis.once(event, () => {
        clearTimeout(timer)
        resolve()
      })
    }
  })
}
