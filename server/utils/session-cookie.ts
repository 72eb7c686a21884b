import { decode } from '@auth/core/jwt'
import { getCookie, type H3Event } from 'h3'
import { secret } from '../secrets'
import { resumeSession, type SignedIn } from '../services/accounts/sessions'
import { cookieNames } from './auth-cookies'

/** The live session behind the request's cookie. The cookie holds only a session id; the database decides. Asked once a request. */
export const sessionOf = (event: H3Event): Promise<SignedIn | null> => (event.context.session ??= readSession(event))

async function readSession(event: H3Event): Promise<SignedIn | null> {
  const sessionId = await sessionIdOf(event)
  return sessionId ? resumeSession(sessionId) : null
}

async function sessionIdOf(event: H3Event): Promise<string | null> {
  const name = cookieNames().session
  const token = getCookie(event, name)
  if (!token) return null
  try {
    const payload = await decode({ token, secret: secret('auth'), salt: name })
    return typeof payload?.sid === 'string' ? payload.sid : null
  }
  catch {
    // A cookie of another installation, or one that was tampered with.
    return null
  }
}
