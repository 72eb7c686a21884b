import type { CampaignKind } from '#shared/schemas/campaign'
import type { Visibility } from '#shared/types/campaign'

export const campaignKindWords: Record<CampaignKind, string> = {
  airglow: 'airglow',
  atmosphere: 'atmosphere',
  interstellar: 'interstellar gas',
  comet: 'comet',
  laboratory: 'laboratory',
  other: 'other',
}

export const visibilityWords: Record<Visibility, string> = {
  members: 'its members only',
  service: 'every account of this service',
}

/** "2026-01-01 to 2026-03-31", "from 2026-01-01", or nothing. */
export function datesWords({ startsOn, endsOn }: { startsOn: string | null, endsOn: string | null }): string {
  if (startsOn && endsOn) return startsOn === endsOn ? startsOn : `${startsOn} to ${endsOn}`
  return startsOn ? `from ${startsOn}` : endsOn ? `until ${endsOn}` : ''
}

/** What the caller is to a campaign. */
export const standing = ({ role, member }: { role: string, member: boolean }): string => member ? `you are ${role}` : 'open to every account'
