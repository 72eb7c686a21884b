import { computed, shallowRef, toValue, watch, type MaybeRefOrGetter } from 'vue'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { knownAbout, newEntry, withAnswer, type FileEntry } from '~/utils/submit/entries'
import type { useEngineWorker } from './useEngineWorker'

type Ask = ReturnType<typeof useEngineWorker>['ask']
export const fileLimit = 1000

const wordsOf = (thrown: unknown) => (thrown instanceof Error ? thrown.message : String(thrown))

/** The chosen files, each read in the worker as soon as it is added; the page keeps a summary, never the numbers. */
export function useFileReading(ask: Ask, common: MaybeRefOrGetter<Partial<SpectrumAbout>> = {}) {
  const entries = shallowRef<FileEntry[]>([])
  const selectedId = shallowRef<number | null>(null)
  const refusal = shallowRef<string | null>(null)
  let lastId = 0

  const selected = computed(() => entries.value.find(entry => entry.id === selectedId.value) ?? null)

  function patch(id: number, change: Partial<FileEntry>) {
    entries.value = entries.value.map(entry => (entry.id === id ? { ...entry, ...change } : entry))
  }

  async function read(entry: FileEntry) {
    patch(entry.id, { state: 'reading' })
    try {
      const summary = await ask('read', { file: entry.file, about: knownAbout(entry) })
      patch(entry.id, { read: summary, state: 'ready', error: null })
    }
    catch (thrown) {
      patch(entry.id, { state: 'unreadable', error: wordsOf(thrown) })
    }
  }

  /** Adds files; the same file (name, size, time) is taken once. */
  async function add(files: File[]) {
    const keyOf = (file: File) => `${file.name}|${file.size}|${file.lastModified}`
    const known = new Set(entries.value.map(entry => keyOf(entry.file)))
    const fresh = files.filter(file => !known.has(keyOf(file)))
    const room = fileLimit - entries.value.length
    refusal.value = fresh.length > room ? `One submission takes ${fileLimit} files; ${fresh.length - room} were left out. Submit them next.` : null
    const added = fresh.slice(0, Math.max(room, 0)).map(file => ({ ...newEntry(++lastId, file), common: toValue(common) }))
    entries.value = [...entries.value, ...added]
    selectedId.value ??= added[0]?.id ?? null
    for (const entry of added) await read(entry)
  }

  function remove(id: number) {
    const index = entries.value.findIndex(entry => entry.id === id)
    entries.value = entries.value.filter(entry => entry.id !== id)
    if (selectedId.value === id) selectedId.value = entries.value[Math.min(index, entries.value.length - 1)]?.id ?? null
  }

  /** Other columns mean other numbers, so those files are read again. */
  async function answer(id: number, said: Partial<SpectrumAbout>, toAll: boolean) {
    const before = new Map(entries.value.map(entry => [entry.id, entry.answers.columns]))
    entries.value = withAnswer(entries.value, id, said, toAll)
    const changed = entries.value.filter(entry => entry.answers.columns !== before.get(entry.id))
    for (const entry of changed) await read(entry)
  }

  function clear() {
    entries.value = []
    selectedId.value = null
  }

  watch(() => toValue(common), said => { entries.value = entries.value.map(entry => ({ ...entry, common: said })) })

  return { entries, selected, selectedId, refusal, add, remove, answer, patch, clear }
}
