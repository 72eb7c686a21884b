import type { Page, RetrievalDetail, RetrievalRow } from '#shared/types/retrieval'
import { toQuery, type RetrievalView } from '~/utils/retrieval-view'

export const retrievalKeys = {
  one: (id: string) => `retrieval:${id}`,
  series: (slug: string) => `campaign:${slug}:series`,
}

export function useRetrievalRows(view: MaybeRefOrGetter<RetrievalView>) {
  const api = useApi()
  const key = () => `retrievals:${JSON.stringify(toQuery(toValue(view)))}`
  return useAsyncData(key, () => api<Page<RetrievalRow>>('/api/retrievals', { query: toQuery(toValue(view)) }))
}

/** The newest observations of a campaign, for its series and night strip. */
export function useCampaignRetrievals(slug: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => retrievalKeys.series(toValue(slug)), () =>
    api<Page<RetrievalRow>>('/api/retrievals', { query: { campaign: toValue(slug), sort: '-observed', limit: 500 } }))
}

/** The lines of a result, for its small picture. */
export function useFetchDetail() {
  const api = useApi()
  return (id: string) => api<RetrievalDetail>(`/api/retrievals/${id}`)
}
