import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { fitSpectrum, fitTable } from '#shared/utils/retrieval/fit'
import type { EngineTasks, TaskName } from './protocol'
import { readFile, summarise } from './read-file'
import { thinnedPixels } from './thin'

type Task<N extends TaskName> = (ask: EngineTasks[N]['ask']) => Promise<EngineTasks[N]['answer']>

const sketch: Task<'sketch'> = async ({ file, about, points }) => {
  const { spectrum: { axis, values } } = await readFile(file, about)
  const pixels = thinnedPixels(values, points)
  return { axis: pixels.map(pixel => axis[pixel]!), values: pixels.map(pixel => values[pixel]!) }
}

/** What the worker can do; each is a plain function, so that it can be tried without a worker. */
export const tasks: { [N in TaskName]: Task<N> } = {
  read: ({ file, about }) => summarise(file, about),
  sketch,
  fitSpectrum: async ({ file, about: said, settings, lineList }) => {
    const { spectrum, about } = await readFile(file, said)
    return fitSpectrum({ spectrum, about, settings, lineList })
  },
  fitTable: async ask => fitTable(ask),
  fitLines: async ({ input }) => ({ result: retrieveFromLines(input), problems: null }),
}
