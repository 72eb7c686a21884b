import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { InstrumentView } from '#shared/schemas/instrument'
import type { LogbookView } from '#shared/schemas/logbook'
import type { StationView } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'

interface Refusal { error: { code: string, message: string, fields?: { path: string, message: string }[], current?: StationView & InstrumentView } }

let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'equipment')
  base = `/api/campaigns/${at.slug}`
  await at.analyst.call('POST', `${base}/stations`, { name: 'Lantern Point', latitude: 58.03, longitude: 6.51, altitude: 45 })
  await at.analyst.call('POST', `${base}/stations`, { name: 'Hollow Ridge', latitude: 61.42, longitude: 9.87 })
  await at.analyst.call('POST', `${base}/instruments`, { name: 'Grating', station: 'lantern-point', axisUnit: 'nm', medium: 'air', fwhm: 0.2 })
})
afterAll(() => connection.end())

const things = [['stations', 'lantern-point'], ['instruments', 'grating']] as const
const read = async <T>(path: string) => (await at.reader.call<T>('GET', `${base}/${path}`)).body

describe.each(things)('one of the %s', (kind, slug) => {
  const path = `${kind}/${slug}`

  it('is read by readers, changed by analysts and leads, and by nobody else', async () => {
    expect((await at.reader.call('GET', `${base}/${path}`)).status).toBe(200)
    for (const person of [at.observer, at.reader]) {
      expect((await person.call('PATCH', `${base}/${path}`, { version: 1, name: 'No' })).status).toBe(403)
      expect((await person.call('POST', `${base}/${path}/archive`)).status).toBe(403)
    }
    const { version } = await read<StationView>(path)
    expect((await at.lead.call<StationView>('PATCH', `${base}/${path}`, { version, name: 'Named by the lead' })).body).toMatchObject({ name: 'Named by the lead', slug, version: version + 1 })
  })

  it('is not found by a stranger, in another campaign, or under another name', async () => {
    const calls: [string, string, object?][] = [['GET', ''], ['PATCH', '', { version: 1, name: 'Mine' }], ['POST', '/archive'], ['POST', '/unarchive']]
    for (const [method, tail, body] of calls) {
      expect([method, tail, (await at.stranger.call(method, `${base}/${path}${tail}`, body)).status]).toEqual([method, tail, 404])
      expect([method, tail, (await at.stranger.call(method, `/api/campaigns/${at.otherSlug}/${path}${tail}`, body)).status]).toEqual([method, tail, 404])
      expect([method, tail, (await at.lead.call(method, `${base}/${kind}/nothing${tail}`, body)).status]).toEqual([method, tail, 404])
    }
  })

  it('answers a stale version with the row as it stands', async () => {
    const before = await read<StationView>(path)
    await at.analyst.call('PATCH', `${base}/${path}`, { version: before.version, name: 'First' })
    const stale = await at.lead.call<Refusal>('PATCH', `${base}/${path}`, { version: before.version, name: 'Second' })
    expect([stale.status, stale.body.error.code]).toEqual([409, 'stale_version'])
    expect(stale.body.error.current).toEqual(await read(path))
    expect(stale.body.error.current?.name).toBe('First')
  })

  it('lets one of two through who change it at once', async () => {
    const { version } = await read<StationView>(path)
    const answers = await Promise.all(['One', 'Two'].map(name => at.analyst.call('PATCH', `${base}/${path}`, { version, name })))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
  })

  it('keeps its address, and says why', async () => {
    const { version } = await read<StationView>(path)
    const refused = await at.analyst.call<Refusal>('PATCH', `${base}/${path}`, { version, slug: 'elsewhere' })
    expect([refused.status, refused.body.error.fields?.[0]?.path]).toEqual([422, 'slug'])
    expect(refused.body.error.fields?.[0]?.message).toContain('stays as it is, because files, scripts and results name it')
  })

  it('cannot be changed while it is archived, and can when it is brought back', async () => {
    const archived = (await at.analyst.call<StationView>('POST', `${base}/${path}/archive`)).body
    expect(archived.archivedAt).toEqual(expect.any(String))
    const refused = await at.analyst.call<Refusal>('PATCH', `${base}/${path}`, { version: archived.version, name: 'Late' })
    expect([refused.status, refused.body.error.code]).toEqual([409, 'archived'])
    expect((await at.analyst.call<StationView>('POST', `${base}/${path}/unarchive`)).body.archivedAt).toBeNull()
  })

  it('has its deeds in its logbook, from what to what', async () => {
    const { id, version } = await read<StationView>(path)
    await at.analyst.call('PATCH', `${base}/${path}`, { version, name: 'Written down' })
    const log = (await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=${kind.slice(0, -1)}:${id}&sort=-at&limit=3`)).body
    expect(log.items[0]).toMatchObject({ action: 'change', actor: 'analyst', detail: { name: { to: 'Written down' } }, object: { kind: kind.slice(0, -1), name: 'Written down', address: slug } })
    expect(log.items.slice(1).map(entry => entry.action)).toEqual(['unarchive', 'archive'])
  })
})

describe('a station', () => {
  it('stands somewhere or nowhere: half a place is refused', async () => {
    const half = await at.analyst.call<Refusal>('POST', `${base}/stations`, { name: 'Half', latitude: 10 })
    expect([half.status, half.body.error.fields?.[0]?.path]).toEqual([422, 'longitude'])
    const { version } = await read<StationView>('stations/hollow-ridge')
    const halved = await at.analyst.call<Refusal>('PATCH', `${base}/stations/hollow-ridge`, { version, latitude: null })
    expect([halved.status, halved.body.error.fields?.[0]]).toEqual([422, { path: 'latitude', message: 'State latitude and longitude both, or neither.' }])
    expect((await at.analyst.call('PATCH', `${base}/stations/hollow-ridge`, { version, latitude: null, longitude: null })).status).toBe(200)
  })

  it('of which nothing can stand in an address gets the first free number', async () => {
    const made = [await at.analyst.call<StationView>('POST', `${base}/stations`, { name: '🔭' }), await at.analyst.call<StationView>('POST', `${base}/stations`, { name: '氷' })]
    expect(made.map(answer => answer.body.slug)).toEqual(['station', 'station-2'])
  })
})

describe('an instrument', () => {
  const change = async (body: object) => at.analyst.call<InstrumentView & Refusal>('PATCH', `${base}/instruments/grating`, { version: (await read<InstrumentView>('instruments/grating')).version, ...body })

  it('has a line width or a resolving power, not both', async () => {
    const both = await change({ resolvingPower: 8000 })
    expect([both.status, both.body.error.fields?.[0]]).toEqual([422, { path: 'resolvingPower', message: 'State the line width or the resolving power, not both.' }])
    expect((await change({ resolvingPower: 8000, fwhm: null })).body).toMatchObject({ resolvingPower: 8000, fwhm: null })
    expect((await change({ resolvingPower: 0 })).status).toBe(422)
  })

  it('moves to another station of its campaign, and the logbook names both', async () => {
    const moved = await change({ station: 'hollow-ridge', notes: 'Moved in spring.' })
    expect(moved.body.station).toBe('hollow-ridge')
    const log = (await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=instrument:${moved.body.id}&sort=-at&limit=1`)).body
    expect(log.items[0]?.detail).toEqual({ notes: { from: '', to: 'Moved in spring.' }, station: { from: 'lantern-point', to: 'hollow-ridge' } })
    expect((await change({ station: 'nowhere' })).body.error.fields?.[0]?.path).toBe('station')
  })

  it('is not put at an archived station, and stays at one that is archived later', async () => {
    await at.analyst.call('POST', `${base}/stations/lantern-point/archive`)
    await at.analyst.call('POST', `${base}/stations/hollow-ridge/archive`)
    expect((await change({ station: 'lantern-point' })).body.error.code).toBe('archived')
    expect((await change({ station: 'hollow-ridge', notes: 'Still there.' })).body).toMatchObject({ station: 'hollow-ridge', notes: 'Still there.' })
    expect((await at.analyst.call<Refusal>('POST', `${base}/instruments`, { name: 'Late', station: 'lantern-point' })).body.error.code).toBe('archived')
  })
})
