import type { LineRetrievalInput } from '#shared/engine/types'
import type { LineTable } from '#shared/schemas/line-table'
import type { RetrievalSettings } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import type { SpectrumAbout } from '#shared/types/spectrum'
import type { FitAnswer } from '#shared/utils/retrieval/fit'
import type { ReadSummary } from '~/utils/submit/entries'

/** A thinned spectrum in the file's own axis, for the plot before anything is known. */
export interface Sketch { axis: number[], values: number[] }

/** What the worker can be asked, and what it answers. Plain data both ways. */
export interface EngineTasks {
  read: { ask: { file: File, about: Partial<SpectrumAbout> }, answer: ReadSummary }
  sketch: { ask: { file: File, about: Partial<SpectrumAbout>, points: number }, answer: Sketch }
  fitSpectrum: { ask: { file: File, about: Partial<SpectrumAbout>, settings: RetrievalSettings, lineList: LineList }, answer: FitAnswer }
  fitTable: { ask: { table: LineTable, settings: RetrievalSettings, lineList: LineList | null }, answer: FitAnswer }
  fitLines: { ask: { input: LineRetrievalInput }, answer: FitAnswer }
}
export type TaskName = keyof EngineTasks

export interface Request { id: number, task: TaskName, ask: EngineTasks[TaskName]['ask'] }
export type Reply = { id: number, answer: EngineTasks[TaskName]['answer'] } | { id: number, error: string }
