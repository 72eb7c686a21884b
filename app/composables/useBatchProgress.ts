import type { Phase } from '#shared/types/phases'
import { isFinal } from '#shared/types/phases'
import type { BatchCounts, RetrievalEvent, RetrievalRow } from '#shared/types/retrieval'
import { useBatch, useBatchRows } from '~/queries/batches'

/** A batch that moves by itself: rows from the list, laid over by what the stream says. */
export async function useBatchProgress(id: string) {
  const [{ data: batch, error, refresh: refreshCounts }, { data: rows, refresh: refreshRows }] = await Promise.all([useBatch(id), useBatchRows(id)])
  const moved = reactive(new Map<string, { phase: Phase, progress: number }>())
  const shown = computed<RetrievalRow[]>(() => rows.value.map(row => ({ ...row, ...moved.get(row.id) })))
  const byPhase = computed(() => shown.value.reduce<Partial<Record<Phase, number>>>((counts, { phase }) => ({ ...counts, [phase]: (counts[phase] ?? 0) + 1 }), {}))
  const finished = computed(() => shown.value.filter(row => isFinal(row.phase)).length)
  const done = computed(() => batch.value?.done ?? false)

  async function refresh() {
    await Promise.all([refreshCounts(), refreshRows()])
    moved.clear()
  }
  const { state } = useEventStream<RetrievalEvent, BatchCounts>(() => error.value || done.value ? null : `/api/batches/${id}/events`, {
    onEvent: event => moved.set(event.retrievalId, { phase: event.phase, progress: event.progress }),
    onDone: () => void refresh(),
    poll: async () => {
      await refresh()
      return done.value
    },
  })
  // Temperatures are not part of the events: they are read again now and then while results come in.
  let known = finished.value
  usePolling(() => finished.value > known, async () => {
    known = finished.value
    await refreshRows()
  }, 3000)
  return { batch, rows: shown, byPhase, finished, done, state, error, refresh }
}
