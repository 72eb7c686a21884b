import { emptyView, fromRoute, toRoute, type RetrievalView } from '~/utils/retrieval-view'

/** The view of the retrievals table, kept in the address. A change of filter or order begins at the first page. */
export function useRetrievalView() {
  const route = useRoute()
  const view = computed(() => fromRoute(route.query))
  const before = ref<string[]>([])
  const show = (next: RetrievalView) => navigateTo({ path: route.path, query: toRoute(next) }, { replace: true })

  function change(part: Partial<RetrievalView>) {
    before.value = []
    return show({ ...view.value, ...part, cursor: '' })
  }
  function next(cursor: string) {
    before.value = [...before.value, view.value.cursor]
    return show({ ...view.value, cursor })
  }
  function previous() {
    const cursor = before.value.at(-1) ?? ''
    before.value = before.value.slice(0, -1)
    return show({ ...view.value, cursor })
  }
  const clear = () => change({ ...emptyView, sort: view.value.sort, limit: view.value.limit })
  return { view, change, next, previous, clear, page: computed(() => before.value.length + 1) }
}
