import { shallowRef, type ShallowRef } from 'vue'
import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { groupBy, uploadSlices } from '~/utils/submit/slices'
import type { FileEntry } from '~/utils/submit/entries'

export interface SendingParts {
  entries: ShallowRef<FileEntry[]>
  patch: (id: number, change: Partial<FileEntry>) => void
  upload: (campaign: string, files: File[], about: Partial<SpectrumAbout>) => Promise<{ items: UploadItem[] }>
}


/**
 * Stores the files slice by slice. A slice that fails keeps its files, so that the next attempt sends only what is
 * not stored yet. Each file goes with what was said of it: files with the same answers share requests.
 */
export function useSending({ entries, patch, upload }: SendingParts) {
  const sent = shallowRef(0)
  const total = shallowRef(0)

  function settle(entry: FileEntry, item: UploadItem | undefined) {
    if (item?.ok && item.id) patch(entry.id, { state: 'stored', spectrumId: item.id, remarks: item.warnings, error: null })
    else patch(entry.id, { state: 'refused', error: item?.error?.message ?? 'The service refused this file.' })
    sent.value += 1
  }

  async function sendSlice(campaign: string, slice: FileEntry[], common: Partial<SpectrumAbout>) {
    for (const entry of slice) patch(entry.id, { state: 'sending' })
    try {
      const { items } = await upload(campaign, slice.map(entry => entry.file), { ...common, ...slice[0]?.answers })
      slice.forEach((entry, index) => settle(entry, items[index]))
    }
    catch (thrown) {
      for (const entry of slice) patch(entry.id, { state: 'ready' })
      throw thrown
    }
  }

  /** Sends what is not stored yet and gives back the ids of all stored spectra, in the order of the list. */
  async function send(campaign: string, common: Partial<SpectrumAbout>): Promise<string[]> {
    const open = entries.value.filter(entry => entry.state === 'ready' || entry.state === 'refused')
    sent.value = entries.value.filter(entry => entry.state === 'stored').length
    total.value = sent.value + open.length
    for (const group of groupBy(open, entry => JSON.stringify(entry.answers))) {
      for (const slice of uploadSlices(group)) await sendSlice(campaign, slice, common)
    }
    return entries.value.flatMap(entry => entry.spectrumId ?? [])
  }

  return { sent, total, send }
}
