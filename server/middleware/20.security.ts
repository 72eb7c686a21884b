import { randomBytes } from 'node:crypto'
import { defineEventHandler, setResponseHeader, setResponseHeaders } from 'h3'
import { config } from '../config'
import { apiPolicy, pagePolicy, securityHeaders } from '../utils/security-headers'

/** Headers that keep browsers from doing what our pages never ask for. */
export default defineEventHandler((event) => {
  setResponseHeaders(event, securityHeaders(config().origin.startsWith('https:')))
  if (event.path.startsWith('/api/')) {
    setResponseHeader(event, 'content-security-policy', apiPolicy)
    setResponseHeader(event, 'cache-control', 'no-store')
    return
  }
  const nonce = randomBytes(18).toString('base64')
  event.context.nonce = nonce
  setResponseHeader(event, 'content-security-policy', pagePolicy(nonce, import.meta.dev))
  if (!event.path.startsWith('/_nuxt/')) setResponseHeader(event, 'cache-control', 'no-store')
})
