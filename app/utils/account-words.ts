import type { MailPreference, TokenScope } from '#shared/types/roles'

export const mailWords: Record<MailPreference, { label: string, hint: string }> = {
  each: { label: 'Each result', hint: 'One message for each retrieval, also within a batch.' },
  digest: { label: 'A digest for each batch', hint: 'A single submission still gets its own message; failures are always named.' },
  none: { label: 'No mail', hint: 'Results wait on the desk.' },
}

export const scopeWords: Record<TokenScope, string> = { read: 'read only', submit: 'read and submit' }
