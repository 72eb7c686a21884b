import type { InvitationView } from '#shared/schemas/invitation'
import type { CampaignRole } from '#shared/types/roles'
import { campaignRoles } from '#shared/types/roles'
import { roleDeeds } from '#shared/utils/role-words'
import { dayText } from './time-text'

export const roleOptions: { value: CampaignRole, label: string }[] = campaignRoles.map(role => ({ value: role, label: role }))

/** "As observer one uploads ..." under a choice of role. */
export const roleHint = (role: CampaignRole): string => `As ${role}: ${roleDeeds[role]}.`

/** How an invitation stands, in words and with its day. */
export function invitationWords({ state, acceptedAt, expiresAt }: InvitationView): string {
  if (state === 'accepted') return `accepted ${dayText(acceptedAt)}`
  if (state === 'withdrawn') return 'withdrawn'
  return state === 'waiting' ? `waiting, until ${dayText(expiresAt)}` : `expired ${dayText(expiresAt)}`
}

export const invitedAs = ({ role, asAdministrator }: Pick<InvitationView, 'role' | 'asAdministrator'>): string =>
  role ?? (asAdministrator ? 'administrator' : 'account')
