import type { MailPreference, TokenScope } from '#shared/types/roles'

/** Who asks. A session may do all that its account may; a token only what its scope allows. */
export interface Actor {
  userId: string
  email: string
  name: string
  isAdministrator: boolean
  mailPreference: MailPreference
  via: 'session' | 'token'
  /** The sign-in that asks; null for a token. */
  sessionId: string | null
  scope: TokenScope
}
