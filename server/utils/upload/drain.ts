import type { IncomingMessage } from 'node:http'

const lingerMilliseconds = 10_000

/**
 * Lets the rest of a refused body flow into nothing, so that the answer reaches a client that is still sending:
 * closing at once would reset the connection and the client would never read why.
 * A client that goes on for longer than ten seconds is cut off.
 */
export function drain(request: IncomingMessage): void {
  if (request.readableEnded || request.destroyed) return
  const timer = setTimeout(() => request.socket.destroy(), lingerMilliseconds)
  timer.unref()
  const stop = () => clearTimeout(timer)
  request.once('end', stop).once('close', stop).on('error', stop)
  request.resume()
}
