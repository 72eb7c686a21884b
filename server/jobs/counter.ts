import type { Redis } from 'ioredis'
import { config } from '../config'
import { onStop } from '../lifecycle'
import { redisConnection, settled } from './connection'

interface Count { count: number, until: number }
export interface Counted { count: number, secondsLeft: number }

let redis: Redis | undefined
const local = new Map<string, Count>()

/**
 * Adds to a counter that starts anew `windowSeconds` after its first count. Shared by all processes through Redis;
 * while Redis is down each process counts for itself.
 */
export async function countUp(name: string, windowSeconds: number): Promise<Counted> {
  const key = keyOf(name)
  try {
    const [[, count], , [, ttl]] = await (await connection()).multi().incr(key).expire(key, windowSeconds, 'NX').ttl(key).exec() as [[unknown, number], unknown, [unknown, number]]
    return { count, secondsLeft: Math.max(ttl, 1) }
  }
  catch {
    return countLocally(key, windowSeconds, Date.now())
  }
}

/** Takes one count back. */
export async function countDown(name: string): Promise<void> {
  const key = keyOf(name)
  const entry = local.get(key)
  if (entry) entry.count = Math.max(0, entry.count - 1)
  // Only where the counter lives: DECR would make one that never expires.
  await (await connection()).eval("if redis.call('exists', KEYS[1]) == 1 then return redis.call('decr', KEYS[1]) end return 0", 1, key).catch(() => 0)
}

export async function forgetCount(name: string): Promise<void> {
  local.delete(keyOf(name))
  await (await connection()).del(keyOf(name)).catch(() => 0)
}

/** The count within this process alone. */
export function countLocally(key: string, windowSeconds: number, now: number): Counted {
  for (const [old, { until }] of local) if (until <= now) local.delete(old)
  const entry = local.get(key) ?? { count: 0, until: now + windowSeconds * 1000 }
  entry.count++
  local.set(key, entry)
  return { count: entry.count, secondsLeft: Math.max(1, Math.ceil((entry.until - now) / 1000)) }
}

const keyOf = (name: string) => `trotline:${config().instance}:${name}`

async function connection(): Promise<Redis> {
  if (!redis) {
    redis = redisConnection('producer')
    onStop('queue', 'counters', () => redis?.disconnect())
  }
  await settled(redis)
  return redis
}

/** Whether Redis answers now. */
export const redisAnswers = async (): Promise<boolean> => (await connection()).ping().then(() => true, () => false)

/** What Redis calls itself; null when it does not answer. */
export const redisVersion = async (): Promise<string | null> =>
  (await connection()).info('server').then(text => /redis_version:(\S+)/.exec(text)?.[1] ?? null, () => null)
