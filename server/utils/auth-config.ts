import type { AuthConfig } from '@auth/core'
import Credentials from '@auth/core/providers/credentials'
import type { SessionData } from '#shared/types/account'
import { credentialsSchema } from '#shared/schemas/account'
import { logger } from '../logger'
import { secret } from '../secrets'
import { closeSession, openSession, sessionSeconds, type SignedIn } from '../services/accounts/sessions'
import { cookieNames } from './auth-cookies'

/** What the sign-in library is told for one request; `live` is the session behind its cookie. */
export function authConfig({ live, userAgent }: { live: SignedIn | null, userAgent: string }): AuthConfig {
  return {
    basePath: '/api/auth',
    secret: secret('auth'),
    trustHost: true,
    session: { strategy: 'jwt', maxAge: sessionSeconds },
    pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
    cookies: cookies(),
    useSecureCookies: cookieNames().secure,
    providers: [Credentials({
      credentials: { email: {}, password: {} },
      authorize: async (input) => {
        const given = credentialsSchema.safeParse(input)
        const opened = given.success ? await openSession({ ...given.data, userAgent }) : null
        return opened && { id: opened.userId, sessionId: opened.sessionId }
      },
    })],
    callbacks: {
      jwt: ({ token, user }) => {
        if (user) return { sid: (user as { sessionId?: string }).sessionId }
        return live ? { sid: token.sid } : null
      },
      session: ({ session }) => (live ? { ...session, ...toSessionData(live) } : session),
    },
    events: {
      signOut: async (message) => {
        if ('token' in message && typeof message.token?.sid === 'string') await closeSession(message.token.sid)
      },
    },
    logger: {
      // A wrong password or a missing form token is the visitor's matter, not a fault of ours.
      error: error => logger.debug({ reason: error.message, kind: error.name }, 'sign-in refused'),
      warn: () => undefined,
      debug: () => undefined,
    },
  }
}

function cookies(): AuthConfig['cookies'] {
  const names = cookieNames()
  const options = { httpOnly: true, sameSite: 'lax', path: '/', secure: names.secure } as const
  return {
    sessionToken: { name: names.session, options },
    csrfToken: { name: names.csrf, options },
    callbackUrl: { name: names.callback, options },
  }
}

export const toSessionData = ({ actor, expiresAt }: SignedIn): SessionData => ({
  user: { id: actor.userId, email: actor.email, name: actor.name, isAdministrator: actor.isAdministrator, mailPreference: actor.mailPreference },
  expires: expiresAt.toISOString(),
})
