import { parentPort } from 'node:worker_threads'
import type { LineList } from '#shared/types/line-list'
import type { ThreadReply, ThreadRequest } from './protocol'
import { tasks, type TaskName, type ThreadTasks } from './tasks'

const lists = new Map<string, LineList>()

function listOf({ lineList }: ThreadRequest): LineList | null {
  if (lineList?.list) lists.set(lineList.key, lineList.list)
  return lineList ? lists.get(lineList.key) ?? null : null
}

function reply(request: ThreadRequest): ThreadReply {
  try {
    const run = tasks[request.task] as (ask: ThreadTasks[TaskName]['ask'], list: LineList | null) => ThreadTasks[TaskName]['answer']
    return { answer: run(request.ask, listOf(request)) }
  }
  catch (error) {
    return { fault: error instanceof Error ? error.stack ?? error.message : String(error) }
  }
}

parentPort?.on('message', (request: ThreadRequest) => parentPort?.postMessage(reply(request)))
