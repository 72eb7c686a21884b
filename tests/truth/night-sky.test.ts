import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import type { RetrievalResult } from '#shared/engine/types'
import { normaliseSpectrum } from '#shared/engine/units/normalise'
import { readSpectrum } from '#shared/formats/read-spectrum'
import { loadLineList } from '#shared/line-lists/index'
import { settingsSchema } from '#shared/schemas/settings'
import { prepareFromSpectrum } from '#shared/utils/retrieval'
import { referenceBytes } from './readers/reference-file'

/** From the file's bytes to a result, as a submission goes. */
async function retrieve(strengthSet: string): Promise<RetrievalResult> {
  const outcome = readSpectrum(referenceBytes('spectra/nearir_sky_b.fits'), 'nearir_sky_b.fits', { axisUnit: 'angstrom', medium: 'vacuum', valueKind: 'photons' })
  if (!outcome.ok) throw new Error(outcome.error.message)
  const { about } = outcome
  const spectrum = normaliseSpectrum(outcome.spectrum, { unit: about.axisUnit, medium: about.medium, airFormula: about.airFormula })
  if ('problem' in spectrum) throw new Error(spectrum.problem)
  const settings = settingsSchema.parse({ lineList: 'oh-meinel', bands: ['4-2'], lines: ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)'], strengthSet, noise: 'from-residuals' })
  const prepared = prepareFromSpectrum({ spectrum: { ...spectrum, about }, settings, lineList: await loadLineList('oh-meinel') })
  if ('problem' in prepared) throw new Error(JSON.stringify(prepared.problem))
  return retrieveFromSpectrum(prepared.input)
}

/**
 * A real exposure of the night sky (nearir_sky_b.fits). No temperature was published with it: the expected values are two independent
 * line-by-line readings (184.9 and 185.5 K with brooke2016, 186.9 and 187.4 K with mies1974), so this is a check of plausibility.
 */
describe('OH(4-2) P1(2) to P1(5) in a real night-sky spectrum', () => {
  it.each([['brooke2016', 185.2], ['mies1974', 187.2]])('reads with %s within 3 K of %d K', async (set, expected) => {
    const result = await retrieve(set)
    expect(result.reason).toBeUndefined()
    expect(Math.abs(result.temperature!.value - expected)).toBeLessThan(3)
  })

  it('says that the noise was taken from the residuals, and compares the strength sets', async () => {
    const result = await retrieve('brooke2016')
    expect(result.flags).toContain('sigma-assumed')
    expect(result.lines.filter(line => line.used).map(line => line.label)).toEqual(['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)'])
    expect(result.strengthSets.map(({ name }) => name)).toContain('mies1974')
  })
})
