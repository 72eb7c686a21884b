import { watchDebounced } from '@vueuse/core'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import type { RetrievalSettings } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import { isComplete, knownAbout, type FileEntry } from '~/utils/submit/entries'
import type { Sketch } from '~/workers/protocol'
import type { useEngineWorker } from './useEngineWorker'
import { useLatest } from './useLatest'

const sketchPoints = 2000

/** The plot of the selected file at once, and a fit of it as soon as nothing is missing. */
export function useFilePreview(entry: MaybeRefOrGetter<FileEntry>, settings: MaybeRefOrGetter<RetrievalSettings | null>, lineList: MaybeRefOrGetter<LineList | null>, ask: ReturnType<typeof useEngineWorker>['ask']) {
  const drawing = useLatest((of: FileEntry) => ask('sketch', { file: of.file, about: knownAbout(of), points: sketchPoints }))
  const fitting = useLatest((of: FileEntry, by: RetrievalSettings, list: LineList) => ask('fitSpectrum', { file: of.file, about: knownAbout(of), settings: by, lineList: list }))
  const complete = computed(() => isComplete(toValue(entry)))
  const about = computed(() => JSON.stringify(knownAbout(toValue(entry))))
  const sketch = computed<Sketch | null>(() => drawing.value.value)

  watchDebounced([() => toValue(entry).id, () => toValue(entry).read], () => {
    if (toValue(entry).read) void drawing.run(toValue(entry))
    else drawing.clear()
  }, { immediate: true, debounce: 50 })

  watchDebounced([() => toValue(entry).id, about, complete, () => toValue(settings), () => toValue(lineList)], () => {
    const by = toValue(settings)
    const list = toValue(lineList)
    if (complete.value && by && list) void fitting.run(toValue(entry), by, list)
    else fitting.clear()
  }, { immediate: true, debounce: 150 })

  return { sketch, fit: fitting, complete }
}
