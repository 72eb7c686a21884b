import { loadLineList } from '#shared/line-lists/index'
import { lineTableSchema } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import type { RetrievalSettingsInput } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import type { SpectrumAbout } from '#shared/types/spectrum'
import { prepareFromSpectrum, prepareFromTable } from '#shared/utils/retrieval'
import type { InputProblem, Prepared } from '#shared/utils/retrieval'

export const oh = await loadLineList('oh-meinel') as LineList
export const co = await loadLineList('co-rotation') as LineList
export const p1 = ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)']

/** A table as it comes from outside, checked by its schema. */
export function fromTable(table: object, settings: RetrievalSettingsInput = {}, lineList: LineList | null = oh) {
  return prepareFromTable({ table: lineTableSchema.parse(table), settings: settingsSchema.parse(settings), lineList })
}

/** A flat spectrum of 1520-1560 nm: what is prepared does not depend on its values. */
export function fromSpectrum(settings: RetrievalSettingsInput, about: Partial<SpectrumAbout> = { axisUnit: 'nm', valueKind: 'photons' }, lineList: LineList | null = oh) {
  const wavelength = Array.from({ length: 401 }, (_, i) => 1520 + 0.1 * i)
  const spectrum = { wavelength, values: wavelength.map(() => 1), sigma: null, about }
  return prepareFromSpectrum({ spectrum, settings: settingsSchema.parse(settings), lineList })
}

export function inputOf<Input>(prepared: Prepared<Input>): Input {
  if ('problem' in prepared) throw new Error(JSON.stringify(prepared.problem))
  return prepared.input
}

export function problemsOf<Input>(prepared: Prepared<Input>): InputProblem[] {
  if ('input' in prepared) throw new Error('there is no problem')
  return prepared.problem
}

/** Intensities of any size for labels. */
export const lines = (labels: string[], more: object = {}) => labels.map((label, i) => ({ label, intensity: 10 + i, sigma: 1, ...more }))
