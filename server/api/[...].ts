import { defineEventHandler, setResponseHeader } from 'h3'
// @ts-expect-error The server's own list of routes exists in the built server only.
import { handlers } from '#nitro-internal-virtual/server-handlers'
import { DomainError } from '#shared/utils/domain-error'
import { methodsAt, type KnownRoute } from '../utils/route-match'

/** Everything under /api that no route took: another method, or nothing at all. */
export default defineEventHandler((event) => {
  const path = event.path.split('?')[0]!
  const methods = methodsAt(path, (handlers as Partial<KnownRoute>[]).filter((handler): handler is KnownRoute => handler.route !== undefined))
  if (!methods.length) throw new DomainError('not_found', `There is no ${path} in this API.`)
  setResponseHeader(event, 'allow', methods.join(', '))
  throw new DomainError('method_not_allowed', `${path} takes ${methods.join(', ')}.`)
})
