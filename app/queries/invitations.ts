import type { AcceptInvitation, InvitationOffer, InvitationOutcome, InvitationView } from '#shared/schemas/invitation'
import type { CampaignRole } from '#shared/types/roles'
import type { Page } from '#shared/types/retrieval'

/** Of a campaign (its slug), or of the service (null). */
const path = (slug: string | null) => slug === null ? '/api/admin/invitations' : `/api/campaigns/${encodeURIComponent(slug)}/invitations`

/** False for `wanted`: nothing is asked, for whoever may not see them. */
export function useInvitations(slug: string | null, wanted: MaybeRefOrGetter<boolean> = true) {
  const api = useApi()
  return useAsyncData(`invitations:${slug ?? 'service'}`, async () =>
    toValue(wanted) ? (await api<Page<InvitationView>>(path(slug), { query: { limit: 500 } })).items : [], { default: (): InvitationView[] => [] })
}

export interface InvitationInput { email: string, role?: CampaignRole, asAdministrator?: boolean }

export function useInvitationChanges(slug: string | null) {
  const api = useApi()
  return {
    invite: (input: InvitationInput) => api<InvitationView>(path(slug), { method: 'POST', body: { ...input } }),
    resend: ({ id, round }: InvitationView) => api<InvitationView>(`${path(slug)}/${id}/resend`, { method: 'POST', body: { round } }),
    withdraw: ({ id }: InvitationView) => api<null>(`${path(slug)}/${id}`, { method: 'DELETE' }),
  }
}

/** What the link in a mail offers. */
export function useOffer(token: string) {
  const api = useApi()
  return useAsyncData('invitation-offer', () => api<InvitationOffer>('/api/invitations/look', { method: 'POST', body: { token } }))
}

export function useInvitationAnswer() {
  const api = useApi()
  return {
    accept: (input: AcceptInvitation) => api<InvitationOutcome>('/api/invitations/accept', { method: 'POST', body: { ...input } }),
    join: (token: string) => api<InvitationOutcome>('/api/invitations/join', { method: 'POST', body: { token } }),
  }
}
