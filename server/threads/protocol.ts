import type { LineList } from '#shared/types/line-list'
import type { TaskName, ThreadTasks } from './tasks'

/** A line list goes to a thread once and is named by its key from then on. */
export interface ThreadRequest {
  task: TaskName
  ask: ThreadTasks[TaskName]['ask']
  lineList: { key: string, list?: LineList } | null
}
export type ThreadReply = { answer: ThreadTasks[TaskName]['answer'] } | { fault: string }
