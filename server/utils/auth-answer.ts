import { sendWebResponse, setResponseHeader, setResponseStatus, type H3Event } from 'h3'
import { cookieNames } from './auth-cookies'
import { originOf } from './auth-request'
import type { TooManyAttempts } from '../services/accounts/sign-in-limit'

/** The library answers a wrong password with 200; scripts and logs want it said by the status. */
export async function sendAuthResponse(event: H3Event, response: Response): Promise<unknown> {
  const refused = await refusalIn(response)
  if (!refused) return sendWebResponse(event, isSessionQuestion(event) ? withOnlySessionCookie(response) : response)
  setResponseStatus(event, 401)
  return { error: { code: 'invalid_credentials', message: 'The e-mail address or the password is wrong.' }, url: refused }
}

async function refusalIn(response: Response): Promise<string | null> {
  if (response.status !== 200 || !response.headers.get('content-type')?.startsWith('application/json')) return null
  const answer = await response.clone().json() as { url?: unknown } | null
  return typeof answer?.url === 'string' && new URL(answer.url).searchParams.get('error') === 'CredentialsSignin' ? answer.url : null
}

/** `url` is what the page's composable reads the reason from. */
export function answerTooMany(event: H3Event, error: TooManyAttempts): unknown {
  setResponseStatus(event, 429)
  setResponseHeader(event, 'retry-after', error.retryAfter)
  return { error: { code: error.code, message: error.message }, url: `${originOf(event)}/sign-in?error=RateLimited` }
}

const isSessionQuestion = (event: H3Event) => event.method === 'GET' && event.path.split('?')[0] === '/api/auth/session'

/** Every rendered page asks for the session; the cookies of the sign-in form need not come along each time. */
function withOnlySessionCookie(response: Response): Response {
  const headers = new Headers(response.headers)
  headers.delete('set-cookie')
  const { session } = cookieNames()
  for (const cookie of response.headers.getSetCookie()) if (cookie.startsWith(`${session}=`)) headers.append('set-cookie', cookie)
  return new Response(response.body, { status: response.status, headers })
}
