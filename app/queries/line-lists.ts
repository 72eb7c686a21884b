import type { LineList, LineListSummary } from '#shared/types/line-list'
import type { Page } from '#shared/types/retrieval'

export function useLineLists() {
  const api = useApi()
  return useAsyncData('line-lists', async () => (await api<Page<LineListSummary>>('/api/line-lists')).items, { default: (): LineListSummary[] => [] })
}

/** A list is some hundred kilobytes, so it is fetched by the browser and not written into the page. */
export function useLineList(id: MaybeRefOrGetter<string | null>) {
  const api = useApi()
  return useAsyncData(() => `line-list:${toValue(id) ?? ''}`, async () => {
    const name = toValue(id)
    return name ? api<LineList>(`/api/line-lists/${encodeURIComponent(name)}`) : null
  }, { server: false })
}
