import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import { normaliseSpectrum } from '#shared/engine/units/normalise'
import { prepareFromSpectrum } from '#shared/utils/retrieval/from-spectrum'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import type { EngineTasks, FitAnswer, TaskName } from './protocol'
import { readFile, summarise } from './read-file'
import { thinnedPixels } from './thin'

type Task<N extends TaskName> = (ask: EngineTasks[N]['ask']) => Promise<EngineTasks[N]['answer']>
const impossible = (problems: NonNullable<FitAnswer['problems']>): FitAnswer => ({ result: null, problems })

const sketch: Task<'sketch'> = async ({ file, about, points }) => {
  const { spectrum: { axis, values } } = await readFile(file, about)
  const pixels = thinnedPixels(values, points)
  return { axis: pixels.map(pixel => axis[pixel]!), values: pixels.map(pixel => values[pixel]!) }
}

const fitSpectrum: Task<'fitSpectrum'> = async ({ file, about, settings, lineList }) => {
  const { spectrum, about: known } = await readFile(file, about)
  const onVacuum = normaliseSpectrum(spectrum, { unit: known.axisUnit, medium: known.medium, airFormula: known.airFormula })
  if ('problem' in onVacuum) return impossible([{ path: 'axis', message: onVacuum.problem }])
  const prepared = prepareFromSpectrum({ spectrum: { ...onVacuum, about: known }, settings, lineList })
  return 'problem' in prepared ? impossible(prepared.problem) : { result: retrieveFromSpectrum(prepared.input), problems: null }
}

const fitTable: Task<'fitTable'> = async (ask) => {
  const prepared = prepareFromTable(ask)
  return 'problem' in prepared ? impossible(prepared.problem) : { result: retrieveFromLines(prepared.input), problems: null }
}

/** What the worker can do; each is a plain function, so that it can be tried without a worker. */
export const tasks: { [N in TaskName]: Task<N> } = {
  read: ({ file, about }) => summarise(file, about),
  sketch,
  fitSpectrum,
  fitTable,
  fitLines: async ({ input }) => ({ result: retrieveFromLines(input), problems: null }),
}
