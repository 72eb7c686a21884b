import type { SignedIn } from '../services/accounts/sessions'

declare module 'h3' {
  interface H3EventContext {
    /** Ties log lines, job and mail to the request. */
    requestId?: string
    userId?: string
    session?: Promise<SignedIn | null>
    /** Of this page's inline scripts and styles. */
    nonce?: string
  }
}
