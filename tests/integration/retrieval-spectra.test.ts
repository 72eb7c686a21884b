import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { nightSpectrum } from '../../docker-free-scripts/demo/night-spectrum.mjs'
import type { SpectrumView } from '#shared/schemas/spectrum-view'
import type { PictureData, RetrievalDetail } from '#shared/types/retrieval'
import { said, settings } from '../helpers/batch-of-spectra'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { eventually } from '../helpers/stack'
import { upload } from '../helpers/upload'

let connection: Connection
let at: TwoCampaigns

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'pictures')
})
afterAll(() => connection.end())

async function uploaded(name: string, content: string, about: object = said): Promise<string> {
  const { items: [item] } = await upload(at.observer, at.slug, [{ name, content }], about)
  return item!.id!
}
const submit = async (body: object) => (await at.observer.call<{ ids: [string] }>('POST', `/api/campaigns/${at.slug}/retrievals`, { settings, ...body })).body.ids[0]
const detail = async (id: string) => (await at.observer.call<RetrievalDetail>('GET', `/api/retrievals/${id}`)).body
const reaches = (id: string, phase: string) => eventually(async () => {
  const row = await detail(id)
  return row.phase === phase && row
}, `${id} is ${phase}`, 30)

describe('a spectrum that does not say all that a fit needs', () => {
  it('is held, completed on its page, submitted, and gives its temperature', async () => {
    const { medium: _, ...incomplete } = said
    const spectrumId = await uploaded('held.csv', nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 190, seed: 31 }), incomplete)
    const id = await submit({ spectrumIds: [spectrumId] })
    expect(await detail(id)).toMatchObject({ phase: 'HELD', reason: 'Not stated: air or vacuum.', may: { submit: true } })
    expect((await at.observer.call('POST', `/api/retrievals/${id}/submit`)).status).toBe(422)
    const { body: { version } } = await at.observer.call<SpectrumView>('GET', `/api/spectra/${spectrumId}`)
    expect((await at.observer.call('PATCH', `/api/spectra/${spectrumId}`, { version, about: { medium: 'vacuum' } })).status).toBe(200)
    expect((await at.observer.call('POST', `/api/retrievals/${id}/submit`)).status).toBe(202)
    const { temperature, uNoise } = await reaches(id, 'COMPLETED')
    expect(Math.abs(temperature! - 190)).toBeLessThan(4 * uNoise!)
  })

  it('may be kept as a draft and completed later', async () => {
    const { medium: _, ...incomplete } = said
    const spectrumId = await uploaded('draft.csv', nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 205, seed: 32 }), incomplete)
    const id = await submit({ spectrumIds: [spectrumId], hold: true })
    expect((await detail(id)).phase).toBe('PENDING')
    expect((await at.observer.call('POST', `/api/retrievals/${id}/submit`)).status).toBe(422)
    expect((await at.observer.call('PATCH', `/api/spectra/${spectrumId}`, { version: 1, about: { medium: 'vacuum' } })).status).toBe(200)
    expect((await at.analyst.call('POST', `/api/retrievals/${id}/submit`)).status).toBe(202)
    const { temperature, uNoise } = await reaches(id, 'COMPLETED')
    expect(Math.abs(temperature! - 205)).toBeLessThan(4 * uNoise!)
  })
})

describe('the picture of a spectrum', () => {
  it.each([[0.22, 40], [0.35, 43]])('has the model of the stored fit, with lines that share an area, and follows the data: FWHM %s nm', async (fwhm, seed) => {
    const text: string = nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 195, seed, fwhm })
    const id = await submit({ spectrumIds: [await uploaded(`fwhm ${fwhm}.csv`, text)] })
    const { measurement } = (await reaches(id, 'COMPLETED')).result!.spectrum!
    expect(measurement.labels.some(label => label.includes(' + '))).toBe(true)
    const { body: picture } = await at.reader.call<PictureData>('GET', `/api/retrievals/${id}/picture`)
    const sigma = new Map(text.trim().split('\n').slice(1).map(row => row.split(',').map(Number) as [number, number, number]).map(([x, , s]) => [x, s]))
    const residuals = picture.model.flatMap((model, i) => model === null ? [] : [(picture.values[i]! - model) / sigma.get(picture.wavelength[i]!)!])
    expect(residuals.length).toBe(measurement.pixelRange[1] - measurement.pixelRange[0] + 1)
    const chi2 = residuals.reduce((sum, r) => sum + r * r, 0)
    // Another shift, width or set of lines would give another chi2.
    expect(Math.abs(chi2 / measurement.chi2 - 1)).toBeLessThan(1e-3)
    expect(Math.sqrt(chi2 / residuals.length)).toBeGreaterThan(0.85)
    expect(Math.sqrt(chi2 / residuals.length)).toBeLessThan(1.15)
  })

  it('shows the spectrum alone where there was no fit, and nothing for a line table', async () => {
    const text: string = nightSpectrum({ band: '4-2', medium: 'vacuum', temperature: 195, seed: 41 })
    const id = await submit({ spectrumIds: [await uploaded('elsewhere.csv', text)] })
    await reaches(id, 'ERROR')
    const { body: picture } = await at.observer.call<PictureData>('GET', `/api/retrievals/${id}/picture`)
    expect([picture.wavelength.length, picture.model.every(model => model === null)]).toEqual([1024, true])
  })
})
