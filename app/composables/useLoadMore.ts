import type { Page } from '#shared/types/retrieval'

/** A list that grows by its next page at a press. Asked anew when the key changes; `refresh` begins again with the first page. */
export async function useLoadMore<T>(key: () => string, ask: (cursor?: string) => Promise<Page<T>>, idOf: (item: T) => string) {
  const { data: first, error, refresh, status } = await useAsyncData(key, () => ask())
  const rest = shallowRef<Page<T>[]>([])
  watch(first, () => { rest.value = [] })
  const newest = computed(() => rest.value.at(-1) ?? first.value)
  const items = computed(() => {
    const all = [first.value, ...rest.value].flatMap(page => page?.items ?? [])
    // A row that came meanwhile moves the pages: none is shown twice.
    return [...new Map(all.map(item => [idOf(item), item])).values()]
  })
  const { busy, error: moreError, submit: more } = useSubmit(async () => {
    const cursor = newest.value?.nextCursor
    if (cursor) rest.value = [...rest.value, await ask(cursor)]
  })
  return {
    items,
    total: computed(() => first.value?.total ?? 0),
    hasMore: computed(() => Boolean(newest.value?.nextCursor)),
    loading: computed(() => status.value === 'pending'),
    error: computed(() => error.value ?? moreError.value),
    busy, more, refresh,
  }
}
