import { defineEventHandler } from 'h3'
import { DomainError } from '#shared/utils/domain-error'
import { started } from '../lifecycle'

const answersAtOnce = new Set(['/api/health', '/api/ready'])
const patienceMs = 10_000

/** Requests that arrive before the schema is current wait a little instead of failing. */
export default defineEventHandler(async (event) => {
  if (!event.path.startsWith('/api/') || answersAtOnce.has(event.path.split('?')[0]!)) return
  const ready = await Promise.race([started().then(() => true), new Promise<false>(resolve => setTimeout(resolve, patienceMs, false).unref())])
  if (!ready) throw new DomainError('dependency_down', 'The service is starting and waits for its database; try again shortly.')
})
