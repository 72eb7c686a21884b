import type { Desk } from '#shared/types/desk'

export function useDesk() {
  const api = useApi()
  return useAsyncData('desk', () => api<Desk>('/api/desk'))
}
