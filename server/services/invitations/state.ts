import type { InvitationView } from '#shared/schemas/invitation'
import type { InvitationRow, ListedInvitation } from '../../database/invitations/repository'

export function stateOf({ acceptedAt, withdrawnAt, expiresAt }: InvitationRow, now = new Date()): InvitationView['state'] {
  if (acceptedAt) return 'accepted'
  if (withdrawnAt) return 'withdrawn'
  return expiresAt > now ? 'waiting' : 'expired'
}

export const invitationView = ({ invitation, invitedByName }: ListedInvitation): InvitationView => ({
  id: invitation.id,
  email: invitation.email,
  role: invitation.role,
  asAdministrator: invitation.asAdministrator,
  state: stateOf(invitation),
  invitedBy: invitedByName,
  createdAt: invitation.createdAt.toISOString(),
  sentAt: invitation.sentAt.toISOString(),
  expiresAt: invitation.expiresAt.toISOString(),
  acceptedAt: invitation.acceptedAt?.toISOString() ?? null,
  round: invitation.round,
})
