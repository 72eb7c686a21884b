import { nightSpectrum } from '../../docker-free-scripts/demo/night-spectrum.mjs'
import type { SpectrumRetrievalInput } from '#shared/engine/types'
import { loadLineList } from '#shared/line-lists/index'
import { settingsSchema, type RetrievalSettingsInput } from '#shared/schemas/settings'
import { prepareFromSpectrum } from '#shared/utils/retrieval/from-spectrum'

interface Night { temperature?: number, seed?: number, fwhm?: number, bandStrength?: number }

/** The engine's input from an invented night spectrum of OH(3-1), 1024 pixels. */
export async function nightInput(night: Night = {}, said: RetrievalSettingsInput = {}): Promise<SpectrumRetrievalInput> {
  const text: string = nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 190, seed: 5, ...night })
  const rows = text.trim().split('\n').slice(1).map(line => line.split(',').map(Number))
  const column = (index: number) => Float64Array.from(rows, row => row[index]!)
  const settings = settingsSchema.parse({ lineList: 'oh-meinel', bands: ['3-1'], lines: ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)'], strengthSet: 'brooke2016', ...said })
  const spectrum = { wavelength: column(0), values: column(1), sigma: column(2), about: { axisUnit: 'nm' as const, medium: 'vacuum' as const, valueKind: 'photons' as const } }
  const prepared = prepareFromSpectrum({ spectrum, settings, lineList: await loadLineList('oh-meinel') })
  if ('problem' in prepared) throw new Error(JSON.stringify(prepared.problem))
  return prepared.input
}
