import type { RetrievalResult } from '#shared/engine/types'
import type { RetrievalDetail } from '#shared/types/retrieval'
import { useLineList } from '~/queries/line-lists'
import { lineKey } from '~/utils/chart-data/line-key'
import { recomputeInput, switchableLines } from '~/utils/result/recompute'
import { useEngineWorker } from './useEngineWorker'
import { useLatest } from './useLatest'

/** Lines switched on and off on the page: the engine in this browser gives the number at once, from the stored measurement. */
export function useLineSwitching(detail: MaybeRefOrGetter<RetrievalDetail | null | undefined>) {
  const { ask } = useEngineWorker()
  const stored = computed(() => toValue(detail)?.result ?? null)
  const lines = computed(() => switchableLines({ result: stored.value }))
  const storedOn = computed(() => new Set(lines.value.filter(line => line.used).map(lineKey)))
  const on = shallowRef<ReadonlySet<string>>(storedOn.value)
  watch(storedOn, (keys) => { on.value = keys })
  const changed = computed(() => on.value.size !== storedOn.value.size || [...on.value].some(key => !storedOn.value.has(key)))

  // The list is only fetched once somebody switches a line.
  const touched = ref(false)
  const listId = computed(() => {
    const source = toValue(detail)
    return touched.value ? source?.lineTable?.lineList ?? source?.settings.lineList ?? null : null
  })
  const { data: list, error: listError } = useLineList(listId)
  const fit = useLatest(async () => {
    const source = toValue(detail)
    const input = source ? recomputeInput(source, list.value ?? null, on.value) : null
    if (!input) throw new Error('These lines cannot be recomputed here. Save the choice as a revision: the service measures them again.')
    const answer = await ask('fitLines', { input })
    if (!answer.result) throw new Error(answer.problems[0]?.message ?? 'These lines cannot be fitted.')
    return answer.result
  })

  watch([on, list], () => {
    if (!changed.value) return fit.clear()
    if (listId.value && !list.value) return
    void fit.run()
  })
  function turn(key: string) {
    touched.value = true
    const next = new Set(on.value)
    if (!next.delete(key)) next.add(key)
    on.value = next
  }
  /** What the page shows: the recomputed result over the stored one, with the lines that only stood beside kept as they were. */
  const shown = computed<RetrievalResult | null>(() => (changed.value && fit.value.value) || stored.value)
  /** The lines of the stored choice and those switched on beyond it. */
  const main = computed(() => lines.value.filter(line => line.used || on.value.has(lineKey(line))))
  const labels = computed(() => lines.value.filter(line => on.value.has(lineKey(line))).map(line => line.label))
  const problem = computed(() => fit.problem.value ?? (listError.value ? 'The line list could not be loaded; the numbers stay as stored.' : null))
  return { lines, main, on, turn, changed, shown, labels, busy: fit.busy, problem, reset: () => { on.value = storedOn.value } }
}
