import type { ServerResponse } from 'node:http'
import { isFinal } from '#shared/types/phases'
import { getHeader, type H3Event } from 'h3'
import { logger } from '../logger'
import type { Followed, FollowedEvent } from '../services/retrievals/follow'
import { requireActor } from './auth'

const heartbeatMs = 15_000
/** So soon a stream notices that its sign-in has ended. */
const lookMs = 3000
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
    let replayed = false
    let quietSince = Date.now()
    const end = () => {
      if (ended) return
      ended = true
      clearInterval(looking)
      open.delete(end)
      stop()
      res.end()
      resolve()
    }
    const write = (text: string) => {
      res.write(text)
      quietSince = Date.now()
    }
    const writeEvents = (events: FollowedEvent[]) => {
      for (const { id, kind, data } of events.filter(one => one.id > last)) {
        last = id
        write(`id: ${id}\nevent: ${kind}\ndata: ${JSON.stringify(data)}\n\n`)
      }
    }
    // Read anew each time: a sign-in or a membership that has ended ends the stream.
    const look = async () => {
      try {
        event.context.session = undefined
        const counts = await followed.ask(await requireActor(event, 'read'))
        const rest = counts.done ? await followed.rest(last) : []
        if (ended) return
        if (counts.done) {
          writeEvents(rest)
          write(`id: ${last}${doneMark}\nevent: done\ndata: ${JSON.stringify(counts)}\n\n`)
          end()
        }
        else if (Date.now() - quietSince >= heartbeatMs) write(': still here\n\n')
      }
      catch (error) {
        logger.info({ reason: (error as Error).message }, 'event stream ended')
        end()
      }
    }
    const looking = setInterval(() => void look(), lookMs)
    open.add(end)
    res.on('close', end)
    const tell = (events: FollowedEvent[]) => {
      if (ended) return
      writeEvents(events)
      if (replayed && events.some(({ data }) => isFinal(data.phase))) void look()
    }
    followed.start(afterId, tell).then((stopper) => {
      stop = stopper
      replayed = true
      if (ended) stop()
      else void look()
    }, end)
  })
}
