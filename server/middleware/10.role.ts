import { createError, defineEventHandler } from 'h3'
import { config } from '../config'

const workerAnswers = new Set(['/api/health', '/api/ready', '/api/metrics'])

/** A worker serves nobody: it only says how it is. */
export default defineEventHandler((event) => {
  if (config().role === 'worker' && !workerAnswers.has(event.path.split('?')[0]!)) throw createError({ statusCode: 404 })
})
