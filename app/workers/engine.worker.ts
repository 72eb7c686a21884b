import type { Reply, Request } from './protocol'
import { tasks } from './tasks'

type AnyTask = (ask: Request['ask']) => Promise<Extract<Reply, { answer: unknown }>['answer']>
const post = (reply: Reply) => self.postMessage(reply)

// One after the other: a long fit is not overtaken by a later question.
let before: Promise<void> = Promise.resolve()
self.onmessage = ({ data: { id, task, ask } }: MessageEvent<Request>) => {
  before = before.then(async () => {
    try {
      post({ id, answer: await (tasks[task] as AnyTask)(ask) })
    }
    catch (thrown) {
      post({ id, error: thrown instanceof Error ? thrown.message : String(thrown) })
    }
  })
}
