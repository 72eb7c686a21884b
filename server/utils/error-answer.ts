import { errorStatus, type ErrorBody, type ErrorCode } from '#shared/types/error-codes'
import { DomainError } from '#shared/utils/domain-error'
import { TooManyAttempts } from '../services/accounts/sign-in-limit'

export interface ErrorAnswer { status: number, body: ErrorBody, /** Seconds to wait. */ retryAfter?: number, /** Something of ours broke: log it in full. */ unexpected: boolean }

const byStatus: Partial<Record<number, { code: ErrorCode, message: string }>> = {
  400: { code: 'bad_request', message: 'The request cannot be read.' },
  401: { code: 'unauthenticated', message: 'Sign in, or send an API token.' },
  403: { code: 'forbidden', message: 'This is not allowed.' },
  404: { code: 'not_found', message: 'There is nothing at this address.' },
  405: { code: 'method_not_allowed', message: 'This address does not take that method.' },
  413: { code: 'payload_too_large', message: 'The request is too large.' },
  415: { code: 'unsupported_media_type', message: 'This content type is not taken here.' },
}

/** Two requests at once, of which the database let one through. */
const lostRaces: Record<string, { code: ErrorCode, message: string } | undefined> = {
  ER_NO_REFERENCED_ROW_2: { code: 'conflict', message: 'What this rests on was deleted meanwhile. Load it again and decide anew.' },
  ER_ROW_IS_REFERENCED_2: { code: 'conflict', message: 'Something rests on this by now, so that it cannot be deleted.' },
  ER_LOCK_DEADLOCK: { code: 'dependency_down', message: 'Others changed the same things at the same moment; try again.' },
  ER_LOCK_WAIT_TIMEOUT: { code: 'dependency_down', message: 'Others were changing the same things; try again.' },
}

const connectionFaults = new Set(['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'EPIPE', 'ENOTFOUND', 'PROTOCOL_CONNECTION_LOST', 'ER_SERVER_SHUTDOWN', 'ER_CON_COUNT_ERROR', 'POOL_CLOSED'])

/** Turns whatever was thrown into what the caller may know. Never a stack, a query or a path. */
export function toErrorAnswer(error: unknown, requestId: string): ErrorAnswer {
  const causes = causesOf(error)
  const domain = causes.find(cause => cause instanceof DomainError)
  if (domain) return { ...answer(domain.code, domain.message, { fields: domain.fields, current: domain.current }), ...(domain instanceof TooManyAttempts ? { retryAfter: domain.retryAfter } : {}) }
  if (causes.some(cause => codesOf(cause).some(code => connectionFaults.has(code)))) {
    return { ...answer('dependency_down', `A service this needs is not reachable; try again shortly. (request ${requestId})`), unexpected: true }
  }
  const lost = causes.flatMap(codesOf).map(code => lostRaces[code]).find(Boolean)
  if (lost) return answer(lost.code, lost.message)
  const inner = causes.map(innerError).find(Boolean)
  if (inner) return { ...answer(inner.code, inner.message), unexpected: errorStatus[inner.code] >= 500 }
  const known = causes.map(cause => byStatus[statusOf(cause)]).find(Boolean)
  if (known) return answer(known.code, known.message)
  return { ...answer('internal', `Something went wrong on our side; it has been logged as request ${requestId}.`), unexpected: true }
}

function answer(code: ErrorCode, message: string, extra: { fields?: ErrorBody['error']['fields'], current?: unknown } = {}): ErrorAnswer {
  const error: ErrorBody['error'] = { code, message }
  if (extra.fields) error.fields = extra.fields
  if (extra.current !== undefined) error.current = extra.current
  return { status: errorStatus[code], body: { error }, unexpected: false }
}

function causesOf(error: unknown): unknown[] {
  const chain: unknown[] = []
  for (let next = error; next != null && chain.length < 8; next = (next as { cause?: unknown }).cause) chain.push(next)
  return chain
}

/** A page that was being drawn had asked our own API and was refused: the same answer holds for the page. */
function innerError(cause: unknown): ErrorBody['error'] | undefined {
  const error = (cause as { data?: Partial<ErrorBody> | null }).data?.error
  return error && error.code in errorStatus ? error : undefined
}

function codesOf(cause: unknown): string[] {
  const { code, errors } = cause as { code?: unknown, errors?: unknown[] }
  // Node reports a refused connection to a name with several addresses as one error holding the others.
  return [code, ...(Array.isArray(errors) ? errors.map(inner => (inner as { code?: unknown }).code) : [])].filter(item => typeof item === 'string')
}

function statusOf(cause: unknown): number {
  const { statusCode, unhandled } = cause as { statusCode?: unknown, unhandled?: unknown }
  return typeof statusCode === 'number' && !unhandled ? statusCode : 0
}
