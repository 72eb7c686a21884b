import type { ServerResponse } from 'node:http'
import { getHeader, type H3Event } from 'h3'
import { logger } from '../logger'
import type { Followed, FollowedEvent } from '../services/retrievals/follow'
import { requireActor } from './auth'

const heartbeatMs = 15_000
/** Marks the id of the closing event: who comes back with it has heard all. */
const doneMark = '.done'

const open = new Set<() => void>()

/** Ends every stream, so that a stopping process waits for none. */
export function stopEventStreams(): void {
  for (const end of [...open]) end()
}

const lastIdOf = (event: H3Event): string => getHeader(event, 'last-event-id') ?? ''

/** Answers with server-sent events until all has ended, the client leaves, its sign-in ends, or the process stops. */
export async function sendEvents(event: H3Event, followed: Followed): Promise<void> {
  const { res } = event.node
  // The answer is ours alone from here on.
  event._handled = true
  const actor = await requireActor(event, 'read')
  const lastId = lastIdOf(event)
  if (lastId.endsWith(doneMark) && (await followed.ask(actor)).done) {
    // By the standard an answer of 204 tells the browser not to come again.
    res.writeHead(204).end()
    return
  }
  res.writeHead(200, { 'content-type': 'text/event-stream; charset=utf-8', 'cache-control': 'no-store', 'x-accel-buffering': 'no', 'connection': 'keep-alive' })
  res.write('retry: 2000\n\n')
  await serve(event, res, followed, Number.parseInt(lastId, 10) || 0)
}

function serve(event: H3Event, res: ServerResponse, followed: Followed, afterId: number): Promise<void> {
  return new Promise((resolve) => {
    let last = afterId
    let stop = () => { /* not begun yet */ }
    let ended = false
    const end = () => {
      if (ended) return
      ended = true
      clearInterval(heartbeat)
      open.delete(end)
      stop()
      res.end()
      resolve()
    }
    // Read anew each time: a sign-in or a membership that has ended ends the stream.
    const look = async (beat: boolean) => {
      try {
        event.context.session = undefined
        const counts = await followed.ask(await requireActor(event, 'read'))
        if (ended) return
        if (beat) res.write(': still here\n\n')
        if (!counts.done) return
        res.write(`id: ${last}${doneMark}\nevent: done\ndata: ${JSON.stringify(counts)}\n\n`)
        end()
      }
      catch (error) {
        logger.info({ reason: (error as Error).message }, 'event stream ended')
        end()
      }
    }
    const heartbeat = setInterval(() => void look(true), heartbeatMs)
    open.add(end)
    res.on('close', end)
    const tell = (events: FollowedEvent[]) => {
      if (ended) return
      for (const { id, kind, data } of events) {
        last = Math.max(last, id)
        res.write(`id: ${id}\nevent: ${kind}\ndata: ${JSON.stringify(data)}\n\n`)
      }
      if (replayed && events.some(({ data }) => data.phase === 'COMPLETED' || data.phase === 'ERROR' || data.phase === 'ABORTED')) void look(false)
    }
    let replayed = false
    followed.start(afterId, tell).then((stopper) => {
      stop = stopper
      replayed = true
      if (ended) stop()
      else void look(false)
    }, end)
  })
}
