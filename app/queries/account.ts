import type { AccountView, ApiTokenView, DeviceView } from '#shared/types/account'
import type { NewToken, PasswordChange, ProfileChange, SetUp } from '#shared/schemas/account'

export function useAccount() {
  const api = useApi()
  return useAsyncData('me', () => api<AccountView>('/api/me'))
}

export function useTokens() {
  const api = useApi()
  return useAsyncData('me:tokens', async () => (await api<{ items: ApiTokenView[] }>('/api/me/tokens')).items, { default: (): ApiTokenView[] => [] })
}

export function useDevices() {
  const api = useApi()
  return useAsyncData('me:devices', async () => (await api<{ items: DeviceView[] }>('/api/me/devices')).items, { default: (): DeviceView[] => [] })
}

export function useAccountChanges() {
  const api = useApi()
  return {
    change: (change: ProfileChange) => api<AccountView>('/api/me', { method: 'PATCH', body: { ...change } }),
    createToken: (input: Partial<NewToken>) => api<ApiTokenView & { token: string }>('/api/me/tokens', { method: 'POST', body: { ...input } }),
    revokeToken: (id: string) => api<null>(`/api/me/tokens/${id}`, { method: 'DELETE' }),
    revokeDevice: (id: string) => api<null>(`/api/me/devices/${id}`, { method: 'DELETE' }),
    signOutElsewhere: () => api<{ ended: number }>('/api/me/sign-out-elsewhere', { method: 'POST' }),
    changePassword: (change: PasswordChange) => api<null>('/api/me/password', { method: 'POST', body: { ...change } }),
    setUp: (input: SetUp) => api<unknown>('/api/set-up', { method: 'POST', body: { ...input } }),
  }
}
