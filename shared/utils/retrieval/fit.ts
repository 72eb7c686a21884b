import { retrieveFromLines } from '../../engine/retrieve/from-lines'
import { retrieveFromSpectrum } from '../../engine/retrieve/from-spectrum'
import type { RetrievalResult } from '../../engine/types'
import { normaliseSpectrum } from '../../engine/units/normalise'
import type { LineTable } from '../../schemas/line-table'
import type { RetrievalSettings } from '../../schemas/settings'
import type { LineList } from '../../types/line-list'
import type { ReadSpectrum, SpectrumAbout } from '../../types/spectrum'
import { prepareFromSpectrum } from './from-spectrum'
import { prepareFromTable } from './from-table'
import type { InputProblem } from './problem'

/** A fit, or what is missing to make one. */
export type FitAnswer = { result: RetrievalResult, problems: null } | { result: null, problems: InputProblem[] }

interface Terms { settings: RetrievalSettings, lineList: LineList | null }

const impossible = (problems: InputProblem[]): FitAnswer => ({ result: null, problems })

/** From the numbers of a file to the result; the one path of the browser's preview and of the worker. */
export function fitSpectrum({ spectrum, about, settings, lineList }: Terms & { spectrum: ReadSpectrum, about: SpectrumAbout }): FitAnswer {
  const onVacuum = normaliseSpectrum(spectrum, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in onVacuum) return impossible([{ path: 'axis', message: onVacuum.problem }])
  const prepared = prepareFromSpectrum({ spectrum: { ...onVacuum, about }, settings, lineList })
  return 'problem' in prepared ? impossible(prepared.problem) : { result: retrieveFromSpectrum(prepared.input), problems: null }
}

/** From a line table to the result. */
export function fitTable(source: Terms & { table: LineTable }): FitAnswer {
  const prepared = prepareFromTable(source)
  return 'problem' in prepared ? impossible(prepared.problem) : { result: retrieveFromLines(prepared.input), problems: null }
}
