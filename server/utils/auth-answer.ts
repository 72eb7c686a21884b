import { sendWebResponse, setResponseHeader, setResponseStatus, type H3Event } from 'h3'
import { originOf } from './auth-request'
import { TooManyAttempts } from './sign-in-limit'

/** The library answers a wrong password with 200; scripts and logs want it said by the status. */
export async function sendAuthResponse(event: H3Event, response: Response): Promise<unknown> {
  const refused = await refusalIn(response)
  if (!refused) return sendWebResponse(event, response)
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
