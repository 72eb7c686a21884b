import { availableParallelism } from 'node:os'
import source from '#compute-thread'
import { createThreadPool, type ThreadPool } from './pool'

let pool: ThreadPool | undefined

/** Where this process computes; the first use opens it. One core is left to the thread that talks to database and queue. */
export const threads = (): ThreadPool => (pool ??= createThreadPool(source, Math.max(1, availableParallelism() - 1)))

export async function closeThreads(): Promise<void> {
  await pool?.close()
  pool = undefined
}
