import type { LineTable } from '#shared/schemas/line-table'
import type { RetrievalSettings } from '#shared/schemas/settings'
import type { LineMeasurementSet } from '#shared/engine/types'
import type { Description, Said } from '#shared/formats/describe-spectrum'
import { describeSpectrum } from '#shared/formats/describe-spectrum'
import { readSpectrum } from '#shared/formats/read-spectrum'
import type { LineList } from '#shared/types/line-list'
import type { PictureData } from '#shared/types/retrieval'
import type { SpectrumAbout, SpectrumProblem } from '#shared/types/spectrum'
import { drawRetrieval } from '#shared/utils/retrieval/draw'
import { fitSpectrum, fitTable, type FitAnswer } from '#shared/utils/retrieval/fit'
import { thinnedPixels } from '#shared/utils/thin'

interface StoredSpectrum { bytes: Uint8Array, name: string, about: SpectrumAbout }
interface Refused { ok: false, error: SpectrumProblem }

/** What a thread can be asked, and what it answers. Plain data both ways. */
export interface ThreadTasks {
  fitSpectrum: { ask: StoredSpectrum & { settings: RetrievalSettings }, answer: FitAnswer }
  fitTable: { ask: { table: LineTable, settings: RetrievalSettings }, answer: FitAnswer }
  describe: { ask: { bytes: Uint8Array, name: string, said: Said }, answer: Description }
  thin: { ask: StoredSpectrum & { points: number }, answer: { ok: true, axis: number[], values: number[] } | Refused }
  /** `measurement`: the stored one, where there is a fit to draw. */
  draw: { ask: StoredSpectrum & { settings: RetrievalSettings, measurement: LineMeasurementSet | null }, answer: { ok: true, picture: PictureData } | Refused }
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
  describe: ({ bytes, name, said }) => describeSpectrum(bytes, name, said),
  thin({ bytes, name, about, points }) {
    const outcome = readSpectrum(bytes, name, about)
    if (!outcome.ok) return outcome
    const { axis, values } = outcome.spectrum
    const pixels = thinnedPixels(values, points)
    return { ok: true, axis: pixels.map(i => axis[i]!), values: pixels.map(i => values[i]!) }
  },
  draw({ bytes, name, about, settings, measurement }, lineList) {
    const outcome = readSpectrum(bytes, name, about)
    if (!outcome.ok) return outcome
    const picture = drawRetrieval({ spectrum: outcome.spectrum, about, settings, lineList, measurement })
    return 'problem' in picture ? { ok: false, error: { code: 'incomplete_spectrum', message: picture.problem } } : { ok: true, picture }
  },
}
