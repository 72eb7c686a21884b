import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SpectrumView } from '#shared/schemas/spectrum-view'
import type { StationNight } from '#shared/schemas/station'
import type { Page, RetrievalDetail } from '#shared/types/retrieval'
import { lineTable } from '../helpers/line-tables'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { eventually } from '../helpers/stack'

interface Refusal { error: { code: string, message: string, fields?: { path: string, message: string }[] } }
interface Submitted { ids: string[] }

let connection: Connection
let at: TwoCampaigns
let base: string

const table = (more: object = {}) => ({ ...lineTable(200), ...more })
const submit = (body: object) => at.observer.call<Submitted & Refusal>('POST', `${base}/retrievals`, body)
const upload = (about: object) => at.observer.call<{ items: { id: string }[] } & Refusal>('POST', `${base}/spectra`, { name: `s${Math.random()}`, axis: [1500, 1501, 1502], values: [1, Math.random(), 3], axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons', ...about })
const archive = (what: string) => at.lead.call('POST', `${base}/${what}/archive`)
const bringBack = (what: string) => at.lead.call('POST', `${base}/${what}/unarchive`)

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'archive')
  base = `/api/campaigns/${at.slug}`
  await at.analyst.call('POST', `${base}/stations`, { name: 'Far East', latitude: 0, longitude: 170 })
  await at.analyst.call('POST', `${base}/instruments`, { name: 'Eye', station: 'far-east' })
  await at.analyst.call('POST', `${base}/recipes`, { name: 'Plain', settings: { lineList: 'oh-meinel', bands: ['3-1'] } })
})
afterAll(() => connection.end())

describe('what is archived', () => {
  it('takes no submission: not under a recipe, in none of its versions', async () => {
    await archive('recipes/plain')
    for (const recipe of ['plain', 'plain@1']) {
      const refused = await submit({ lineTable: table(), recipe })
      expect([refused.status, refused.body.error.code, refused.body.error.fields]).toEqual([409, 'archived', [{ path: 'recipe', message: 'This recipe is archived.' }]])
      expect(refused.body.error.message).toContain('"Plain" is archived')
    }
    await bringBack('recipes/plain')
    expect((await submit({ lineTable: table(), recipe: 'plain' })).status).toBe(202)
  })

  it.each([['stations/far-east', 'station', 'far-east'], ['instruments/eye', 'instrument', 'eye']])('takes no submission: not at %s', async (path, noun, slug) => {
    const spectrum = (await upload({ [noun]: slug })).body.items[0]!.id
    await archive(path)
    const byTable = await submit({ lineTable: table({ [noun]: slug }) })
    expect([byTable.status, byTable.body.error.code, byTable.body.error.fields?.[0]?.path]).toEqual([409, 'archived', `lineTable.${noun}`])
    const bySpectrum = await submit({ spectrumIds: [spectrum], recipe: 'plain' })
    expect([bySpectrum.status, bySpectrum.body.error.code, bySpectrum.body.error.fields?.[0]?.path]).toEqual([409, 'archived', 'spectrumIds.0'])
    const uploaded = await upload({ [noun]: slug })
    expect([uploaded.status, uploaded.body.error.fields?.[0]?.path]).toEqual([409, `about.${noun}`])
    await bringBack(path)
    expect((await submit({ lineTable: table({ [noun]: slug }) })).status).toBe(202)
  })

  it('takes no submission under an instrument whose station is archived', async () => {
    await archive('stations/far-east')
    expect((await submit({ lineTable: table({ instrument: 'eye' }) })).body.error.message).toContain('station "Far East" is archived')
    await bringBack('stations/far-east')
  })

  it('does not hold up that more is said of a spectrum that is there already', async () => {
    const id = (await upload({ station: 'far-east' })).body.items[0]!.id
    await archive('stations/far-east')
    const { version } = (await at.observer.call<SpectrumView>('GET', `/api/spectra/${id}`)).body
    expect((await at.observer.call('PATCH', `/api/spectra/${id}`, { version, about: { station: 'far-east', exposureSeconds: 60 } })).status).toBe(200)
    await bringBack('stations/far-east')
  })

  it('takes no draft that was made before, in the campaign as under a recipe or at a station', async () => {
    const { ids } = (await submit({ lineTable: table({ station: 'far-east' }), recipe: 'plain', hold: true })).body
    for (const what of ['recipes/plain', 'stations/far-east']) {
      await archive(what)
      expect([what, (await at.observer.call<Refusal>('POST', `/api/retrievals/${ids[0]}/submit`)).body.error.code]).toEqual([what, 'archived'])
      await bringBack(what)
    }
    await at.lead.call('POST', `${base}/archive`)
    expect((await at.observer.call<Refusal>('POST', `/api/retrievals/${ids[0]}/submit`)).body.error.code).toBe('archived')
    expect((await at.observer.call<RetrievalDetail>('GET', `/api/retrievals/${ids[0]}`)).body.may).toEqual({ abort: true, revise: false, review: false, submit: false })
    await at.lead.call('POST', `${base}/unarchive`)
    expect((await at.observer.call('POST', `/api/retrievals/${ids[0]}/submit`)).status).toBe(202)
  })

  it('leaves finished results: they are read, and neither revised nor reviewed while the campaign is archived', async () => {
    const id = (await submit({ lineTable: table() })).body.ids[0]!
    await eventually(async () => (await at.reader.call<RetrievalDetail>('GET', `/api/retrievals/${id}`)).body.phase === 'COMPLETED', 'the retrieval is done')
    await at.lead.call('POST', `${base}/archive`)
    expect((await at.reader.call<RetrievalDetail>('GET', `/api/retrievals/${id}`)).body.temperature).toBeCloseTo(200, 0)
    expect((await at.observer.call<Refusal>('POST', `/api/retrievals/${id}/revise`, { settings: {} })).body.error.code).toBe('archived')
    expect((await at.analyst.call<Refusal>('POST', `/api/retrievals/${id}/review`, { verdict: 'accept' })).body.error.code).toBe('archived')
    await at.lead.call('POST', `${base}/unarchive`)
    expect((await at.analyst.call('POST', `/api/retrievals/${id}/review`, { verdict: 'accept' })).status).toBe(200)
  })
})

describe('the nights of a station', () => {
  it('run from noon to noon in its solar time, the newest first, page by page', async () => {
    await at.analyst.call('POST', `${base}/stations`, { name: 'Dateline', latitude: 0, longitude: 170 })
    // At 170 degrees east solar time is 11 h 20 min ahead of UTC: noon is at 00:40 UTC.
    for (const observedAt of ['2026-01-14T00:39:59Z', '2026-01-14T00:40:01Z', '2026-01-15T00:30:00Z']) await submit({ lineTable: table({ station: 'dateline', observedAt }), hold: true })
    const page = (await at.reader.call<Page<StationNight>>('GET', `${base}/stations/dateline/nights?limit=1`)).body
    expect(page).toEqual({ items: [{ night: '2026-01-14', from: '2026-01-14T00:40:00.000Z', to: '2026-01-15T00:40:00.000Z', total: 2, completed: 0, failed: 0 }], nextCursor: '2026-01-14', total: 2 })
    const rest = (await at.reader.call<Page<StationNight>>('GET', `${base}/stations/dateline/nights?cursor=${page.nextCursor}`)).body
    expect(rest.items.map(({ night, total }) => [night, total])).toEqual([['2026-01-13', 1]])
    expect(rest.nextCursor).toBeNull()
    expect((await at.stranger.call('GET', `${base}/stations/dateline/nights`)).status).toBe(404)
  })
})
