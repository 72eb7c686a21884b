import type { Measurement } from '../../shared/engine/spectrum/measurement'
import { measure } from '../../shared/engine/spectrum/measurement'
import { widthOfStrongest } from '../../shared/engine/spectrum/start-width'
import type { SpectrumRetrievalInput } from '../../shared/engine/types'
import ohMeinel from '../../shared/line-lists/oh-meinel.json'
import { settingsSchema, type RetrievalSettingsInput } from '../../shared/schemas/settings'
import type { LineList } from '../../shared/types/line-list'
import { prepareFromSpectrum } from '../../shared/utils/retrieval/from-spectrum'

const lineList = ohMeinel as LineList

/** The engine's input from the text of a spectrum, on the path that a submission takes. */
export function benchInput(text: string, settings: RetrievalSettingsInput): SpectrumRetrievalInput {
  const rows = text.trim().split('\n').filter(row => /^\d/.test(row)).map(row => row.split(',').map(Number))
  const column = (i: number) => Float64Array.from(rows, row => row[i])
  const spectrum = { wavelength: column(0), values: column(1), sigma: column(2), about: { axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons' } as const }
  const prepared = prepareFromSpectrum({ spectrum, settings: settingsSchema.parse(settings), lineList })
  if ('problem' in prepared) throw new Error(prepared.problem[0].message)
  return prepared.input
}

const fitOf = ({ set, fit }: Measurement) => {
  if (!fit || !set.converged) throw new Error(set.reason)
  return fit
}

/** The same measurement for curve_fit: pixels, components of the lines, basis of the continuum, width that the engine starts from. */
export function curveFitJob(input: SpectrumRetrievalInput) {
  const { problem: { pixels, weighted, system } } = fitOf(measure(input))
  const components = weighted.flatMap((line, i) => line.components.map(component => ({ ...component, line: i })))
  return {
    x: [...pixels.wavelength],
    values: [...pixels.values],
    sigma: Array.from(pixels.weight, weight => 1 / weight),
    centre: components.map(({ wavelength }) => wavelength),
    share: components.map(({ share }) => share),
    line: components.map(({ line }) => line),
    lines: weighted.length,
    basis: system.continuum.map(basis => Array.from(basis, (value, p) => value / pixels.weight[p])),
    fwhm: widthOfStrongest(pixels, 1),
  }
}

export { measureLines } from '../../shared/engine/spectrum/measurement'
export { retrieveFromSpectrum } from '../../shared/engine/retrieve/from-spectrum'
