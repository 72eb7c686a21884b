import type { LineTable } from '#shared/schemas/line-table'
import type { RetrievalSettings } from '#shared/schemas/settings'
import { readSpectrum } from '#shared/formats/read-spectrum'
import type { LineList } from '#shared/types/line-list'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { fitSpectrum, fitTable, type FitAnswer } from '#shared/utils/retrieval/fit'

/** What a thread can be asked, and what it answers. Plain data both ways. */
export interface ThreadTasks {
  fitSpectrum: { ask: { bytes: Uint8Array, name: string, about: SpectrumAbout, settings: RetrievalSettings }, answer: FitAnswer }
  fitTable: { ask: { table: LineTable, settings: RetrievalSettings }, answer: FitAnswer }
}
export type TaskName = keyof ThreadTasks

type Task<N extends TaskName> = (ask: ThreadTasks[N]['ask'], lineList: LineList | null) => ThreadTasks[N]['answer']

/** Each is a plain function, so that it can be tried without a thread. */
export const tasks: { [N in TaskName]: Task<N> } = {
  fitSpectrum({ bytes, name, about, settings }, lineList) {
    const outcome = readSpectrum(bytes, name, about)
    if (!outcome.ok) return { result: null, problems: [{ path: 'spectrum', message: outcome.error.message }] }
    return fitSpectrum({ spectrum: outcome.spectrum, about, settings, lineList })
  },
  fitTable: ({ table, settings }, lineList) => fitTable({ table, settings, lineList }),
}
