import type { LineList } from '#shared/types/line-list'
import { threads } from './index'
import { tasks, type TaskName, type ThreadTasks } from './tasks'

/** What is read here and now: some ten thousand rows, a few milliseconds. */
const smallBytes = 256 * 1024
const patienceSeconds = 60

/**
 * Works on the bytes of a file without holding up whoever else asks this process: a small file at once, a large one in a
 * computing thread.
 */
export async function offLoop<N extends 'describe' | 'thin' | 'draw'>(task: N, ask: ThreadTasks[N]['ask'], lineList: LineList | null = null): Promise<ThreadTasks[N]['answer']> {
  const run = tasks[task] as (ask: ThreadTasks[TaskName]['ask'], lineList: LineList | null) => ThreadTasks[N]['answer']
  return ask.bytes.length <= smallBytes ? run(ask, lineList) : threads().run(task, ask, { lineList, seconds: patienceSeconds })
}
