import type { Connection } from 'mysql2/promise'
import { nightSpectrum } from '../../docker-free-scripts/demo/night-spectrum.mjs'
import ohMeinel from '#shared/line-lists/oh-meinel.json'
import { addAccount, addCampaign, type Account } from './accounts'

export const settings = { observable: 'photon-emission', lineList: 'oh-meinel', bands: ['3-1'], lines: ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)'], strengthSet: 'brooke2016' }
const about = { axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons', columns: { axis: 0, values: 1, sigma: 2 } }

export interface SpectraAtHand { owner: Account, slug: string, spectrumIds: string[] }

/** An invented night of the band 3-1 on `count` pixels, its axis, values and sigmas interpolated: something that keeps a fit busy. */
export const fineSpectrum = (count: number, seed: number): string =>
  interpolated(nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 190, seed }), count)

/** All of OH from 500 to 2400 nm: with every line of every band a fit takes about half a minute. */
export const wideSpectrum = (count: number): string =>
  interpolated(nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 190, seed: 1, start: 500, pixelWidth: 1.85, fwhm: 6 }), count)

export const wideSettings = {
  observable: 'photon-emission', lineList: 'oh-meinel', bands: ohMeinel.bands.map(({ id }) => id),
  lines: [...new Set(ohMeinel.bands.flatMap(({ lines }) => lines.map(({ label }) => label)))],
}

function interpolated(night: string, count: number): string {
  const rows: number[][] = night.trim().split('\n').slice(1).map((line: string) => line.split(',').map(Number))
  const step = (rows.length - 1.001) / (count - 1)
  return Array.from({ length: count }, (_, i) => {
    const left = Math.floor(i * step)
    return rows[left]!.map((value, column) => (value + (i * step - left) * (rows[left + 1]![column]! - value)).toFixed(6)).join(',')
  }).join('\n')
}

export const said = about

const night = (i: number): string => nightSpectrum({ band: '3-1', medium: 'vacuum', temperature: 180 + i / 10, seed: 1 + i, head: ['Invented test data.'] })

interface Options { spectrumOf?: (i: number) => string, preference?: 'each' | 'digest' }

/** A campaign with spectra uploaded and nothing queued; its owner gets a mail for each result unless told otherwise. */
export async function uploadSpectra(connection: Connection, origin: string, slug: string, count: number, { spectrumOf = night, preference = 'each' }: Options = {}): Promise<SpectraAtHand> {
  const campaignId = await addCampaign(connection, slug)
  const owner = await addAccount(connection, origin, { name: slug, preference, campaignId, role: 'observer' })
  const spectrumIds: string[] = []
  for (let start = 0; start < count; start += 50) {
    const form = new FormData()
    form.append('about', JSON.stringify(about))
    for (let i = start; i < Math.min(count, start + 50); i++) {
      form.append('files', new Blob([spectrumOf(i)]), `${slug}-${i}.csv`)
    }
    const response = await fetch(`${origin}/api/campaigns/${slug}/spectra`, { method: 'POST', headers: { authorization: `Bearer ${owner.token}` }, body: form })
    const { items } = await response.json() as { items: { ok: boolean, id: string, missing: string[] }[] }
    if (!items.every(item => item.ok && item.missing.length === 0)) throw new Error(`Spectra were refused: ${JSON.stringify(items).slice(0, 400)}`)
    spectrumIds.push(...items.map(item => item.id))
  }
  return { owner, slug, spectrumIds }
}
