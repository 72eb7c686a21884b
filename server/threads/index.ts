// The pages know of our routes, and through them of this file, but not of what is declared for the server alone.
// eslint-disable-next-line @typescript-eslint/triple-slash-reference
/// <reference path="../types/compute-thread.d.ts" />
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
