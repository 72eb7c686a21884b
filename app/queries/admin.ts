import type { AccountDetail, AccountListQuery, ManagedAccount, ManagedMail, MailListQuery, Overview, QueueView, RetryAnswer, StandingChange, StorageView } from '#shared/schemas/admin'
import type { Page } from '#shared/types/retrieval'

export function useOverview() {
  const api = useApi()
  return useAsyncData('admin:overview', () => api<Overview>('/api/admin/overview'))
}

export function useAdminQueue() {
  const api = useApi()
  return useAsyncData('admin:queue', () => api<QueueView>('/api/admin/queue'))
}

export function useStorageUse() {
  const api = useApi()
  return useAsyncData('admin:storage', () => api<StorageView>('/api/admin/storage'))
}

export interface AccountsAsked { q: string, state: AccountListQuery['state'] }

export function useAccounts(asked: MaybeRefOrGetter<AccountsAsked>) {
  const api = useApi()
  return useLoadMore(() => `admin:accounts:${JSON.stringify(toValue(asked))}`, cursor =>
    api<Page<ManagedAccount>>('/api/admin/accounts', { query: { ...toValue(asked), cursor } }), account => account.id)
}

export function useMails(state: MaybeRefOrGetter<MailListQuery['state'] | ''>) {
  const api = useApi()
  return useLoadMore(() => `admin:mails:${toValue(state)}`, cursor =>
    api<Page<ManagedMail>>('/api/admin/mails', { query: { state: toValue(state) || undefined, cursor } }), mail => mail.id)
}

export function useAdminChanges() {
  const api = useApi()
  return {
    readAccount: (id: string) => api<AccountDetail>(`/api/admin/accounts/${id}`),
    changeAccount: (id: string, change: Partial<StandingChange> & { version: number }) => api<AccountDetail>(`/api/admin/accounts/${id}`, { method: 'PATCH', body: { ...change } }),
    retry: (ids: string[]) => api<RetryAnswer>('/api/admin/queue/retry', { method: 'POST', body: { ids } }),
    resendMail: (id: string) => api<ManagedMail>(`/api/admin/mails/${id}/resend`, { method: 'POST' }),
  }
}
