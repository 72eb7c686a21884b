import type { MailPreference, TokenScope } from './roles'

/** What the browser knows of who is signed in (`useAuth().data`). */
export interface SessionUser {
  id: string
  email: string
  name: string
  isAdministrator: boolean
  mailPreference: MailPreference
}
export interface SessionData { user: SessionUser, expires: string }

/** `GET /api/me` */
export interface AccountView extends SessionUser { createdAt: string, version: number }

/** One row of `GET /api/me/devices`: a sign-in that lives. */
export interface DeviceView {
  id: string
  userAgent: string
  createdAt: string
  lastSeenAt: string
  expiresAt: string
  isThisOne: boolean
}

/** One row of `GET /api/me/tokens`; the token itself is only in the answer that made it. */
export interface ApiTokenView {
  id: string
  name: string
  scope: TokenScope
  createdAt: string
  expiresAt: string | null
  lastUsedAt: string | null
}
