import type { ManagedAccount, ManagedMail, Troubled } from '#shared/schemas/admin'
import { timeText } from './time-text'

export const troubleWords: Record<Troubled['trouble'], string> = {
  fault: 'failed through the service',
  silent: 'running without a sign of life',
  overlong: 'running for far too long',
}

export const mailStateWords: Record<ManagedMail['state'], string> = { waiting: 'waiting', failed: 'given up', sent: 'sent' }

const mailKindWords: Record<string, string> = {
  result: 'a result', failure: 'a failed retrieval', digest: 'a batch', invitation: 'an invitation', membership: 'a change of membership', standing: 'a change of an account',
}
export const mailKindText = (kind: string): string => mailKindWords[kind] ?? kind

export const seenText = ({ lastSeenAt }: ManagedAccount): string => lastSeenAt ? timeText(lastSeenAt) : 'never'

/** "4 min", "3 h", "2 days" since then. */
export function ageText(since: string | null, now: number): string {
  if (!since) return ''
  const minutes = Math.max(0, Math.floor((now - Date.parse(since)) / 60_000))
  if (minutes < 1) return 'less than a minute'
  if (minutes < 120) return `${minutes} min`
  return minutes < 2880 ? `${Math.floor(minutes / 60)} h` : `${Math.floor(minutes / 1440)} days`
}
