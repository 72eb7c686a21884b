import { STATUS_CODES } from 'node:http'
import { getRequestHeaders, getResponseHeader, send, setResponseHeader, setResponseStatus, type H3Error, type H3Event } from 'h3'
import { useNitroApp } from 'nitropack/runtime'
import { logger } from '../logger'
import { toErrorAnswer, type ErrorAnswer } from './error-answer'

/** The one place where errors become answers: our JSON for the API, the error page for people. */
export default async function errorHandler(error: H3Error, event: H3Event): Promise<void> {
  if (event.handled) return
  const requestId = event.context.requestId ?? 'unknown'
  const answer = toErrorAnswer(error, requestId)
  if (answer.unexpected) logger.error({ err: error, requestId, method: event.method, path: event.path.split('?')[0] }, 'request failed')
  // The standard words: the thrown ones may repeat what was asked for.
  setResponseStatus(event, answer.status, STATUS_CODES[answer.status])
  setResponseHeader(event, 'cache-control', 'no-store')
  if (answer.retryAfter) setResponseHeader(event, 'retry-after', answer.retryAfter)
  if (event.path.startsWith('/api/') || isRenderingErrorPage(event)) return sendJson(event, answer)
  const page = await renderErrorPage(event, answer)
  if (event.handled) return
  if (!page) return sendJson(event, answer)
  setResponseHeader(event, 'content-type', 'text/html;charset=utf-8')
  // The page was rendered by an inner request with its own nonce.
  const policy = page.headers.get('content-security-policy')
  if (policy) setResponseHeader(event, 'content-security-policy', policy)
  await send(event, await page.text())
}

function sendJson(event: H3Event, answer: ErrorAnswer): Promise<void> {
  setResponseHeader(event, 'content-type', 'application/json')
  if (answer.status === 401 && !getResponseHeader(event, 'www-authenticate')) setResponseHeader(event, 'www-authenticate', 'Bearer')
  return send(event, JSON.stringify(answer.body))
}

const isRenderingErrorPage = (event: H3Event) => event.path.startsWith('/__nuxt_error') || getRequestHeaders(event)['x-nuxt-error'] !== undefined

async function renderErrorPage(event: H3Event, { status, body }: ErrorAnswer): Promise<Response | null> {
  const query = new URLSearchParams({ error: 'true', url: event.path, statusCode: String(status), status: String(status), message: body.error.message })
  const headers = { ...getRequestHeaders(event), 'x-nuxt-error': 'true' } as Record<string, string>
  try {
    return await useNitroApp().localFetch(`/__nuxt_error?${query}`, { headers, redirect: 'manual' })
  }
  catch (failure) {
    logger.error({ err: failure, requestId: event.context.requestId }, 'the error page could not be drawn')
    return null
  }
}
