import type { LogbookView } from '#shared/schemas/logbook'
import type { Page } from '#shared/types/retrieval'

export type LogbookEntry = LogbookView

/** What was done with one thing (`retrieval:01J...`), oldest first. Null: nothing is asked. */
export function useLogbook(object: MaybeRefOrGetter<string | null>) {
  const api = useApi()
  return useAsyncData(() => `logbook:${toValue(object) ?? ''}`, async () => {
    const about = toValue(object)
    return about ? (await api<Page<LogbookView>>('/api/logbook', { query: { object: about, limit: 500 } })).items : []
  }, { default: (): LogbookEntry[] => [] })
}
