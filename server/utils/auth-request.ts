import { getHeader, getRequestHeaders, getRequestIP, readRawBody, type H3Event } from 'h3'
import { config } from '../config'

const loopback = /^(127\.0\.0\.1|localhost|\[::1\])(:\d+)?$/

/** The address the visitor uses: ours, or, for an installation on loopback, whichever loopback name was typed. */
export function visitorOrigin(host: string | undefined, ownOrigin: string): string {
  const onLoopback = loopback.test(new URL(ownOrigin).host)
  return onLoopback && host && loopback.test(host) ? `http://${host}` : ownOrigin
}

export const originOf = (event: H3Event): string => visitorOrigin(getHeader(event, 'host'), config().origin)

/** Network address of the visitor; a proxy's word for it counts only where the operator says so. */
export const addressOf = (event: H3Event): string => getRequestIP(event, { xForwardedFor: config().trustProxy }) ?? 'unknown'

/** The request as the sign-in library wants it: a standard Request with our own address. */
export function toAuthRequest(event: H3Event, form: URLSearchParams | null): Request {
  const headers = new Headers()
  for (const [name, value] of Object.entries(getRequestHeaders(event))) if (value !== undefined) headers.set(name, value)
  // The page's composable asks by a form field for an answer instead of a redirect; the library asks for a header.
  if (form?.get('json') === 'true') headers.set('x-auth-return-redirect', '1')
  headers.delete('content-length')
  return new Request(new URL(event.path, originOf(event)), { method: event.method, headers, body: form })
}

const maximumFormBytes = 16 * 1024

/** The url-encoded form of a sign-in or sign-out; anything else is an empty form, which the library refuses. */
export async function readForm(event: H3Event): Promise<URLSearchParams | null> {
  if (event.method !== 'POST') return null
  const declared = Number(getHeader(event, 'content-length') ?? Number.NaN)
  const isForm = (getHeader(event, 'content-type') ?? '').startsWith('application/x-www-form-urlencoded')
  if (!isForm || !(declared <= maximumFormBytes)) return new URLSearchParams()
  return new URLSearchParams(await readRawBody(event, 'utf8') ?? '')
}

/** A path of our own to go on to after signing in; anything else leads to the desk. */
export function localPath(wanted: string | null | undefined, origin: string): string {
  try {
    const url = new URL(wanted ?? '/', origin)
    return url.origin === origin ? `${url.pathname}${url.search}${url.hash}` : '/'
  }
  catch {
    return '/'
  }
}
