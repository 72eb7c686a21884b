import type { MemberView } from '#shared/schemas/campaign'
import type { CampaignRole } from '#shared/types/roles'

const path = (slug: string, userId: string) => `/api/campaigns/${encodeURIComponent(slug)}/members/${userId}`

export function useMemberChanges(slug: string) {
  const api = useApi()
  return {
    changeRole: ({ userId, version }: MemberView, role: CampaignRole) => api<MemberView>(path(slug, userId), { method: 'PATCH', body: { role, version } }),
    remove: ({ userId, version }: MemberView) => api<null>(path(slug, userId), { method: 'DELETE', query: { version } }),
    leave: () => api<null>(`/api/campaigns/${encodeURIComponent(slug)}/leave`, { method: 'POST' }),
  }
}
