import { refDebounced, watchDebounced } from '@vueuse/core'
import { readLineTable } from '#shared/formats/line-table-text/read-line-table'
import type { Observable } from '#shared/engine/types'
import type { LineTable, TableLine } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import { useLineList } from '~/queries/line-lists'
import type { useEngineWorker } from './useEngineWorker'
import { useLatest } from './useLatest'

const hasOwnData = (lines: TableLine[]) => lines.length > 0 && lines.every(line => line.termUpper !== undefined || line.wavenumber !== undefined || line.A !== undefined)

/** A pasted line table: read as it is typed, asked what it does not say, fitted in the browser. */
export function useLineTable(ask: ReturnType<typeof useEngineWorker>['ask']) {
  const text = ref('')
  const name = ref('')
  const observable = ref<Observable | null>(null)
  const lineListId = ref<string | null>(null)
  const band = ref<string | null>(null)
  const strengthSet = ref<string | null>(null)
  const extra = reactive<Pick<LineTable, 'Tbg' | 'populationPer' | 'widthIn' | 'signalIn'>>({})

  const { data: lineList } = useLineList(lineListId)
  const settled = refDebounced(text, 200)
  const reading = computed(() => (settled.value.trim() ? readLineTable(settled.value) : null))
  const lines = computed(() => (reading.value?.ok ? reading.value.lines : []))
  const inline = computed(() => hasOwnData(lines.value))

  const table = computed<LineTable | null>(() => {
    if (!lines.value.length || !observable.value || (!inline.value && !lineListId.value)) return null
    const list = inline.value ? {} : { lineList: lineListId.value!, ...(band.value ? { band: band.value } : {}), ...(strengthSet.value ? { strengthSet: strengthSet.value } : {}) }
    return { observable: observable.value, ...list, ...extra, ...(name.value.trim() ? { name: name.value.trim() } : {}), lines: [...lines.value] }
  })
  /** What is still to be said, in words; null when the table is complete. */
  const lacking = computed(() => {
    if (!lines.value.length) return reading.value ? 'Mend the rows that are named below the text.' : 'Paste a line table first.'
    if (!observable.value) return 'Say what the intensities are.'
    return inline.value || lineListId.value ? null : 'Choose a line list, or give the molecular data of every line as columns.'
  })

  const fit = useLatest((asked: LineTable) => ask('fitTable', { table: asked, settings: settingsSchema.parse({ observable: asked.observable }), lineList: inline.value ? null : lineList.value ?? null }))
  watch(lineListId, () => { band.value = lineList.value?.bands.length === 1 ? lineList.value.bands[0]!.id : null })
  watchDebounced([table, lineList], () => {
    if (table.value && (inline.value || lineList.value)) void fit.run(table.value)
    else fit.clear()
  }, { debounce: 200 })

  return { text, name, observable, lineListId, band, strengthSet, extra, reading, lines, inline, table, lacking, fit }
}
