import { defineEventHandler, getHeader, setResponseHeader } from 'h3'
import { newId } from '../database/ids'
import { logger } from '../logger'

const acceptable = /^[\w-]{8,64}$/

/** Gives each request the id that its log lines, its job and its mail carry. */
export default defineEventHandler((event) => {
  const given = getHeader(event, 'x-request-id')
  const requestId = given && acceptable.test(given) ? given : newId()
  event.context.requestId = requestId
  setResponseHeader(event, 'x-request-id', requestId)
  if (!event.path.startsWith('/api/')) return
  const begun = performance.now()
  event.node.res.once('finish', () => {
    const { userId } = event.context
    logger.info({ requestId, userId, method: event.method, path: event.path.split('?')[0], status: event.node.res.statusCode, ms: Math.round(performance.now() - begun) }, 'request')
  })
})
