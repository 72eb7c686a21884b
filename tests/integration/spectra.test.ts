import { createHash } from 'node:crypto'
import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { LogbookView } from '#shared/schemas/logbook'
import type { SpectrumData, SpectrumView } from '#shared/schemas/spectrum-view'
import type { Page } from '#shared/types/retrieval'
import { rowsOf } from '../helpers/accounts'
import { database, origin, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { fullAbout, spectrumText, upload } from '../helpers/upload'

interface Refusal { error: { code: string, fields?: { path: string }[], current?: SpectrumView } }

let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'spectra')
  base = `/api/campaigns/${at.slug}`
})
afterAll(() => connection.end())

const viewOf = async (id: string, who = at.reader) => (await who.call<SpectrumView>('GET', `/api/spectra/${id}`)).body

describe('uploading', () => {
  it('says of each file by itself what was understood, what is missing and what is wrong', async () => {
    const answer = await upload(at.observer, at.slug, [{ name: 'good.csv', content: spectrumText(200) }, { name: 'broken.csv', content: 'wavelength,flux\n1,2\n2,x\n3,4\n' }, { name: 'empty.csv', content: '' }])
    expect(answer.status).toBe(207)
    expect(answer.items.map(item => [item.name, item.ok])).toEqual([['good.csv', true], ['broken.csv', false], ['empty.csv', false]])
    expect(answer.items[0]).toMatchObject({ missing: expect.arrayContaining(['axisUnit', 'medium', 'valueKind']), understood: { format: 'text', pixelCount: 200 } })
    expect(answer.items[1]!.error?.message).toMatch(/line 3/i)
  })

  it('takes what the person says for all files, and gives back the bytes as they came', async () => {
    const content = spectrumText(300, 1)
    const { items: [item] } = await upload(at.observer, at.slug, [{ name: 'night one.csv', content }], { ...fullAbout, observedAt: '2025-11-03T22:30:00+01:00' })
    expect(item).toMatchObject({ ok: true, missing: [] })
    const view = await viewOf(item!.id!)
    expect(view).toMatchObject({ campaign: at.slug, name: 'night one.csv', pixelCount: 300, wavelengthFrom: 1500, observedAt: '2025-11-03T21:30:00.000Z', sha256: createHash('sha256').update(content).digest('hex') })
    const response = await fetch(`${origin()}/api/spectra/${item!.id}/bytes`, { headers: { authorization: `Bearer ${at.reader.token}` } })
    expect(await response.text()).toBe(content)
    expect(response.headers.get('content-disposition')).toBe('attachment; filename*=UTF-8\'\'night%20one.csv')
    const log = await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=spectrum:${item!.id}`)
    expect(log.body.items).toMatchObject([{ action: 'upload', actor: 'observer' }])
  })

  it('takes a spectrum as JSON', async () => {
    const body = { name: 'by script', axis: [1500, 1501, 1502, 1503], values: [1, 5, 2, 1], axisUnit: 'nm', medium: 'air', valueKind: 'energy' }
    const { status, body: answer } = await at.observer.call<{ items: { id: string, missing: string[] }[] }>('POST', `${base}/spectra`, body)
    expect([status, answer.items[0]!.missing]).toEqual([207, []])
    const view = await viewOf(answer.items[0]!.id)
    expect([view.format, view.about.medium, view.wavelengthFrom! - 1500 > 0.3]).toEqual(['json', 'air', true])
  })

  it('fills what neither person nor file says from the instrument, and lets both overrule it', async () => {
    await at.analyst.call('POST', `${base}/stations`, { name: 'Ridge' })
    await at.analyst.call('POST', `${base}/instruments`, { name: 'Grating', station: 'ridge', axisUnit: 'nm', medium: 'air', valueKind: 'photons' })
    const said = { instrument: 'grating', columns: fullAbout.columns }
    const { items: [silent] } = await upload(at.observer, at.slug, [{ name: 'silent.csv', content: spectrumText(50, 2) }], said)
    const { items: [spoken] } = await upload(at.observer, at.slug, [{ name: 'spoken.csv', content: spectrumText(50, 3) }], { ...said, medium: 'vacuum' })
    expect([silent!.missing, (await viewOf(silent!.id!)).about]).toMatchObject([[], { axisUnit: 'nm', medium: 'air', valueKind: 'photons' }])
    expect((await viewOf(spoken!.id!)).about).toMatchObject({ medium: 'vacuum', valueKind: 'photons' })
    const [row] = await rowsOf<{ slug: string }>(connection, 'SELECT s.slug FROM spectra x JOIN stations s ON s.id = x.station_id WHERE x.id = ?', [silent!.id])
    expect(row?.slug).toBe('ridge')
  })

  it('refuses a station that the campaign does not have, and an about that is no JSON', async () => {
    const nowhere = await upload(at.observer, at.slug, [{ name: 'a.csv', content: spectrumText(20, 4) }], { station: 'nowhere' })
    expect([nowhere.status, nowhere.error?.fields?.[0]?.path]).toEqual([422, 'about.station'])
    const form = new FormData()
    form.append('files', new Blob([spectrumText(20, 5)]), 'a.csv')
    form.append('about', '{medium')
    expect((await fetch(`${origin()}${base}/spectra`, { method: 'POST', headers: { authorization: `Bearer ${at.observer.token}` }, body: form })).status).toBe(400)
  })
})

describe('the same bytes', () => {
  it('are the same spectrum in one campaign, and it is said so', async () => {
    const file = { name: 'first name.csv', content: spectrumText(100, 10) }
    const { items: [first] } = await upload(at.observer, at.slug, [file])
    const { items: [second] } = await upload(at.analyst, at.slug, [{ ...file, name: 'second name.csv' }], fullAbout)
    expect(second!.id).toBe(first!.id)
    expect(second!.warnings.join(' ')).toContain('first name.csv')
    // What the second sender knew and the first did not is taken over.
    expect([first!.missing.length > 0, second!.missing, (await viewOf(first!.id!)).missing]).toEqual([true, [], []])
  })

  it('are one spectrum also when many send them at once', async () => {
    const file = { name: 'rush.csv', content: spectrumText(100, 11) }
    const answers = await Promise.all(Array.from({ length: 6 }, (_, i) => upload(i % 2 ? at.observer : at.lead, at.slug, [file, file], fullAbout)))
    expect(answers.map(answer => answer.status)).toEqual(Array(6).fill(207))
    expect(new Set(answers.flatMap(answer => answer.items.map(item => item.id))).size).toBe(1)
    expect(await rowsOf(connection, 'SELECT id FROM spectra WHERE name = \'rush.csv\'')).toHaveLength(1)
  })

  it('are another spectrum in another campaign', async () => {
    const file = { name: 'shared.csv', content: spectrumText(100, 12) }
    const { items: [ours] } = await upload(at.lead, at.slug, [file])
    const { items: [theirs] } = await upload(at.stranger, at.otherSlug, [file])
    expect([theirs!.ok, theirs!.id === ours!.id, theirs!.warnings]).toEqual([true, false, []])
  })
})

describe('saying more about a spectrum', () => {
  it('fills what was missing, counts the version up, and refuses a stale one', async () => {
    const { items: [item] } = await upload(at.observer, at.slug, [{ name: 'bare.csv', content: spectrumText(80, 20) }])
    const answers = await Promise.all(['vacuum', 'air'].map(medium => at.observer.call<SpectrumView & Refusal>('PATCH', `/api/spectra/${item!.id}`, { version: 1, about: { ...fullAbout, medium } })))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
    const [good, stale] = answers[0]!.status === 200 ? answers : answers.reverse()
    expect(good!.body).toMatchObject({ missing: [], version: 2 })
    expect(stale!.body.error.code).toBe('stale_version')
    expect((await viewOf(item!.id!)).about.medium).toBe(good!.body.about.medium)
  })

  it('is for its owner and for those who may revise anyone\'s', async () => {
    const { items: [item] } = await upload(at.lead, at.slug, [{ name: 'of the lead.csv', content: spectrumText(80, 21) }])
    const patch = (who: typeof at.lead, version: number) => who.call('PATCH', `/api/spectra/${item!.id}`, { version, about: fullAbout })
    expect([(await patch(at.reader, 1)).status, (await patch(at.observer, 1)).status, (await patch(at.analyst, 1)).status]).toEqual([403, 403, 200])
    expect((await at.analyst.call('PATCH', `/api/spectra/${item!.id}`, { version: 2, about: { medium: 'ether' } })).status).toBe(422)
  })
})

describe('numbers for a plot', () => {
  it('take a million pixels and show a line among them', async () => {
    const count = 1_000_000
    const axis = new Float64Array(count)
    const lines = Array.from(axis, (_, i) => `${(100 + i * 0.001).toFixed(3)} ${i === 654_321 ? 9 : 1}`)
    const { items: [item] } = await upload(at.observer, at.slug, [{ name: 'million.txt', content: lines.join('\n') }], { axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons', columns: { axis: 0, values: 1, sigma: null } })
    expect(item).toMatchObject({ ok: true, understood: { pixelCount: count } })
    const { body } = await at.reader.call<SpectrumData>('GET', `/api/spectra/${item!.id}/data?points=500`)
    expect(body.axis.length).toBeLessThanOrEqual(500)
    expect([Math.max(...body.values), body.axis[0], body.axis.at(-1)]).toEqual([9, 100, 1099.999])
  })

  it('refuse one pixel more, saying why', async () => {
    const lines = Array.from({ length: 1_000_001 }, (_, i) => `${i + 1} 1`)
    const { items: [item] } = await upload(at.observer, at.slug, [{ name: 'more.txt', content: lines.join('\n') }])
    expect([item!.ok, item!.error?.code]).toEqual([false, 'too_many_pixels'])
  })
})

describe('another campaign', () => {
  it('finds nothing of ours', async () => {
    const { items: [item] } = await upload(at.observer, at.slug, [{ name: 'ours.csv', content: spectrumText(60, 30) }])
    const path = `/api/spectra/${item!.id}`
    for (const part of ['', '/data', '/bytes']) expect([part, (await at.stranger.call('GET', path + part)).status]).toEqual([part, 404])
    expect((await at.stranger.call('PATCH', path, { version: 1, about: {} })).status).toBe(404)
    expect((await at.stranger.call('GET', `/api/logbook?object=spectrum:${item!.id}`)).status).toBe(404)
    expect((await upload(at.stranger, at.slug, [{ name: 'in.csv', content: spectrumText(60, 31) }])).status).toBe(404)
    expect((await at.stranger.call('POST', `${base}/spectra`, { name: 'in', axis: [1, 2], values: [1, 2] })).status).toBe(404)
  })

  it('is not where readers upload either', async () => {
    expect((await upload(at.reader, at.slug, [{ name: 'in.csv', content: spectrumText(60, 32) }])).status).toBe(403)
    expect((await at.reader.call('GET', '/api/spectra/not-an-id')).status).toBe(422)
  })
})
