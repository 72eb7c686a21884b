import { Auth } from '@auth/core'
import { defineEventHandler, getHeader, getQuery, sendRedirect, type H3Event } from 'h3'
import { cookieNames } from '../../utils/auth-cookies'
import { answerTooMany, sendAuthResponse } from '../../utils/auth-answer'
import { authConfig } from '../../utils/auth-config'
import { addressOf, localPath, originOf, readForm, toAuthRequest } from '../../utils/auth-request'
import { refuseForeignPage } from '../../utils/csrf-check'
import { sessionOf } from '../../utils/session-cookie'
import { admitAttempt, forgiveAttempts, TooManyAttempts } from '../../services/accounts/sign-in-limit'

/** Signing in and out, and the session as the pages see it. */
export default defineEventHandler(async (event) => {
  const path = event.path.split('?')[0]
  if (path === '/api/auth/signin' && event.method === 'GET') return toSignInPage(event)
  refuseForeignPage(event)
  // Asked before the library is, so that a database that is away is an error and not a sign-out.
  const live = await sessionOf(event)
  const form = await readForm(event)
  const attempt = path === '/api/auth/callback/credentials' && form ? { email: form.get('email') ?? '', address: addressOf(event) } : null
  try {
    if (attempt) await admitAttempt(attempt)
  }
  catch (error) {
    if (error instanceof TooManyAttempts) return answerTooMany(event, error)
    throw error
  }
  const response = await Auth(toAuthRequest(event, form), authConfig({ live, userAgent: getHeader(event, 'user-agent') ?? '' }))
  if (attempt && signedIn(response)) await forgiveAttempts(attempt)
  return sendAuthResponse(event, response)
})

function toSignInPage(event: H3Event): Promise<void> {
  const { callbackUrl } = getQuery(event)
  const wanted = localPath(typeof callbackUrl === 'string' ? callbackUrl : null, originOf(event))
  return sendRedirect(event, `/sign-in?${new URLSearchParams({ callbackUrl: wanted })}`)
}

const signedIn = (response: Response): boolean => {
  const { session } = cookieNames()
  return response.headers.getSetCookie().some(cookie => cookie.startsWith(`${session}=`) && !cookie.startsWith(`${session}=;`))
}
