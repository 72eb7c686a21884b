import { onScopeDispose } from 'vue'
import type { EngineTasks, Reply, TaskName } from '~/workers/protocol'

interface Waiting { resolve: (answer: never) => void, reject: (error: Error) => void }

/**
 * The engine in a Web Worker: reading and fitting never hold the page. Started with the first question, ended with
 * the component that asked. Questions are answered in order.
 */
export function useEngineWorker() {
  const waiting = new Map<number, Waiting>()
  let worker: Worker | null = null
  let lastId = 0

  function start(): Worker {
    const started = new Worker(new URL('../workers/engine.worker.ts', import.meta.url), { type: 'module' })
    started.onmessage = ({ data }: MessageEvent<Reply>) => {
      const asked = waiting.get(data.id)
      waiting.delete(data.id)
      if ('error' in data) asked?.reject(new Error(data.error))
      else asked?.resolve(data.answer as never)
    }
    started.onerror = () => fail('The engine could not be loaded in this browser. Reload the page.')
    return started
  }

  function fail(message: string) {
    for (const { reject } of waiting.values()) reject(new Error(message))
    waiting.clear()
    worker?.terminate()
    worker = null
  }

  function ask<N extends TaskName>(task: N, question: EngineTasks[N]['ask']): Promise<EngineTasks[N]['answer']> {
    worker ??= start()
    const id = ++lastId
    return new Promise((resolve, reject) => {
      waiting.set(id, { resolve: resolve as Waiting['resolve'], reject })
      worker?.postMessage({ id, task, ask: question })
    })
  }

  onScopeDispose(() => worker?.terminate())
  return { ask }
}
