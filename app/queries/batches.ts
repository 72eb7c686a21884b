import type { BatchCounts, Page, RetrievalRow } from '#shared/types/retrieval'

export function useBatch(id: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => `batch:${toValue(id)}`, () => api<BatchCounts>(`/api/batches/${toValue(id)}`))
}

/** All retrievals of a batch in pages of 500; a batch has at most 1000. */
export function useBatchRows(id: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => `batch:${toValue(id)}:rows`, async () => {
    const rows: RetrievalRow[] = []
    let cursor: string | undefined
    do {
      const page: Page<RetrievalRow> = await api('/api/retrievals', { query: { batch: toValue(id), sort: 'name', limit: 500, cursor } })
      rows.push(...page.items)
      cursor = page.nextCursor ?? undefined
    } while (cursor)
    return rows
  }, { default: (): RetrievalRow[] => [] })
}
