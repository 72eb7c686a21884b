import { Worker } from 'node:worker_threads'
import type { LineList } from '#shared/types/line-list'
import type { ThreadReply, ThreadRequest } from './protocol'
import type { TaskName, ThreadTasks } from './tasks'

/** A fit that needs more takes its thread with it, not the process. */
const memoryMegabytes = 2048

export interface RunOptions {
  lineList: LineList | null
  /** Of computing, without the wait for a thread. */
  seconds: number
  /** Ends the computing at once; `run` rejects with its reason. */
  signal?: AbortSignal
}

export class ThreadTimeLimit extends Error {}
/** The code in the thread failed, or the thread died. */
export class ThreadFault extends Error {}

interface Job { request: ThreadRequest, options: RunOptions, resolve: (answer: unknown) => void, reject: (reason: unknown) => void }
interface Thread { worker: Worker, lists: Set<string>, job: Job | null, timer?: NodeJS.Timeout }

export interface ThreadPool {
  run: <N extends TaskName>(task: N, ask: ThreadTasks[N]['ask'], options: RunOptions) => Promise<ThreadTasks[N]['answer']>
  close: () => Promise<void>
}

/**
 * At most `size` threads that compute one task each; what comes beyond waits in turn. A task that is aborted or takes too long ends
 * with its thread, and the next one gets a new thread.
 */
export function createThreadPool(source: string, size: number): ThreadPool {
  const threads = new Set<Thread>()
  const waiting: Job[] = []

  function startThread(): Thread {
    const thread: Thread = { worker: new Worker(source, { eval: true, resourceLimits: { maxOldGenerationSizeMb: memoryMegabytes } }), lists: new Set(), job: null }
    threads.add(thread)
    thread.worker.on('message', (reply: ThreadReply) => settle(thread, job => 'fault' in reply ? job.reject(new ThreadFault(reply.fault)) : job.resolve(reply.answer)))
    thread.worker.on('error', error => drop(thread, new ThreadFault(error.message)))
    thread.worker.on('exit', code => drop(thread, new ThreadFault(`The thread ended with code ${code}.`)))
    return thread
  }

  /** Ends a thread; what it worked on fails with the reason. */
  function drop(thread: Thread, reason: unknown): void {
    if (!threads.delete(thread)) return
    void thread.worker.terminate()
    settle(thread, job => job.reject(reason))
  }

  function settle(thread: Thread, end: (job: Job) => void): void {
    const { job } = thread
    clearTimeout(thread.timer)
    thread.job = null
    if (job) end(job)
    next()
  }

  function next(): void {
    const thread = waiting.length > 0 ? [...threads].find(({ job }) => job === null) ?? (threads.size < size ? startThread() : undefined) : undefined
    const job = thread && waiting.shift()
    if (!thread || !job) return
    thread.job = job
    const { seconds } = job.options
    thread.timer = setTimeout(() => drop(thread, new ThreadTimeLimit()), seconds * 1000)
    thread.worker.postMessage(forThread(thread, job.request))
    next()
  }

  /** Wherever the job is: in a thread, or waiting for one. */
  function abort(job: Job): void {
    const thread = [...threads].find(one => one.job === job)
    if (thread) return drop(thread, job.options.signal?.reason)
    const place = waiting.indexOf(job)
    if (place >= 0) waiting.splice(place, 1)[0].reject(job.options.signal?.reason)
  }

  return {
    run: (task, ask, options) => new Promise((resolve, reject) => {
      const { lineList, signal } = options
      if (signal?.aborted) return reject(signal.reason)
      const listening = new AbortController()
      const last = <T>(end: (value: T) => void) => (value: T) => (listening.abort(), end(value))
      const request: ThreadRequest = { task, ask, lineList: lineList && { key: `${lineList.id}@${lineList.version}`, list: lineList } }
      const job: Job = { request, options, resolve: last(resolve) as Job['resolve'], reject: last(reject) }
      signal?.addEventListener('abort', () => abort(job), { once: true, signal: listening.signal })
      waiting.push(job)
      next()
    }),
    async close() {
      for (const job of waiting.splice(0)) job.reject(new ThreadFault('The process is stopping.'))
      await Promise.all([...threads].map(thread => thread.worker.terminate()))
    },
  }
}

/** Leaves out a line list that the thread has. */
function forThread({ lists }: Thread, request: ThreadRequest): ThreadRequest {
  const { lineList } = request
  if (!lineList || !lists.has(lineList.key)) return lineList ? (lists.add(lineList.key), request) : request
  return { ...request, lineList: { key: lineList.key } }
}
