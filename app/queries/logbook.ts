import type { LogbookView } from '#shared/schemas/logbook'
import type { Page } from '#shared/types/retrieval'

export type LogbookEntry = LogbookView

/** One thing (`retrieval:01J...`), or everything in a campaign, of one kind if one is named. */
export type LogbookSubject = { object: string } | { campaign: string, kind?: string }

/** What was done with one thing (`retrieval:01J...`), oldest first. Null: nothing is asked. */
export function useLogbook(object: MaybeRefOrGetter<string | null>) {
  const api = useApi()
  return useAsyncData(() => `logbook:${toValue(object) ?? ''}`, async () => {
    const about = toValue(object)
    return about ? (await api<Page<LogbookView>>('/api/logbook', { query: { object: about, limit: 500 } })).items : []
  }, { default: (): LogbookEntry[] => [] })
}

/** The same newest first, page by page. */
export function useLogbookPages(subject: MaybeRefOrGetter<LogbookSubject>) {
  const api = useApi()
  return useLoadMore<LogbookView>(
    () => `logbook-pages:${JSON.stringify(toValue(subject))}`,
    cursor => api('/api/logbook', { query: { ...toValue(subject), sort: '-at', limit: 30, cursor } }),
    entry => entry.id,
  )
}
