import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumProblem } from '#shared/types/spectrum'
import type { SpectrumRow } from '../../database/spectra/repository'

/** What the sender is told of one file that is in the campaign now, readable or not. */
export function itemOf(name: string, { id, format, pixelCount, about, missing, problem }: SpectrumRow, warnings: string[]): UploadItem {
  if (problem || format === 'unknown') return { name, ok: false, id, missing: [], warnings, ...(problem ? { error: problem } : {}) }
  return { name, ok: true, id, understood: { format, pixelCount, about }, missing, warnings }
}

/** A file that was not kept. */
export const refusedItem = (name: string, error: SpectrumProblem): UploadItem => ({ name, ok: false, missing: [], warnings: [], error })

export const keptWords = 'The file is kept as it came, under "Needs mending": replace it or delete it there.'
