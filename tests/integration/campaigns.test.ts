import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CampaignView, MemberView } from '#shared/schemas/campaign'
import type { InstrumentView } from '#shared/schemas/instrument'
import type { LogbookView } from '#shared/schemas/logbook'
import type { RecipeView } from '#shared/schemas/recipe'
import type { StationView } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'
import { addAccount, caller, rowsOf, tokenFor } from '../helpers/accounts'
import { database, origin, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'

interface Refusal { error: { code: string, fields?: { path: string }[], current?: CampaignView } }

let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'campaigns')
  base = `/api/campaigns/${at.slug}`
})
afterAll(() => connection.end())

describe('beginning a campaign', () => {
  it('is open to anyone who may submit, and makes them its lead', async () => {
    const person = await addAccount(connection, origin(), { name: 'founder' })
    const made = await person.call<CampaignView>('POST', '/api/campaigns', { title: `Ridge nights ${person.userId}`, kind: 'airglow' })
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({ role: 'lead', version: 1, kind: 'airglow', slug: `ridge-nights-${person.userId.toLowerCase()}` })
    const list = await person.call<Page<CampaignView>>('GET', '/api/campaigns')
    expect([list.body.total, list.body.items.map(item => item.id)]).toEqual([1, [made.body.id]])
    const members = await person.call<Page<MemberView>>('GET', `/api/campaigns/${made.body.slug}/members`)
    expect(members.body.items).toMatchObject([{ userId: person.userId, role: 'lead' }])
    const log = await person.call<Page<LogbookView>>('GET', `/api/logbook?object=campaign:${made.body.id}`)
    expect(log.body.items).toMatchObject([{ action: 'create', actor: 'founder' }])
  })

  it('finds a free address for a title that is taken, and refuses an address that is', async () => {
    const title = `Twice ${at.slug}`
    const answers = [await at.lead.call<CampaignView>('POST', '/api/campaigns', { title }), await at.stranger.call<CampaignView>('POST', '/api/campaigns', { title })]
    expect(answers.map(answer => answer.body.slug)).toEqual([`twice-${at.slug}`, `twice-${at.slug}-2`])
    const taken = await at.lead.call<Refusal>('POST', '/api/campaigns', { title, slug: at.slug })
    expect([taken.status, taken.body.error.code, taken.body.error.fields?.[0]?.path]).toEqual([409, 'conflict', 'slug'])
  })

  it('needs a token that may submit, and a title', async () => {
    const reading = caller(origin(), await tokenFor(connection, at.lead.email, 'read'))
    expect((await reading<Refusal>('POST', '/api/campaigns', { title: 'No' })).body.error.code).toBe('insufficient_scope')
    const untitled = await at.lead.call<Refusal>('POST', '/api/campaigns', { title: ' ', colour: 'red' })
    expect([untitled.status, untitled.body.error.fields?.some(field => field.path === 'title')]).toEqual([422, true])
    expect((await fetch(`${origin()}/api/campaigns`)).status).toBe(401)
  })
})

describe('changing a campaign', () => {
  it('is the lead\'s, writes down what changed, and refuses a stale version with the current row', async () => {
    const { version } = (await at.lead.call<CampaignView>('GET', base)).body
    const changed = await at.lead.call<CampaignView>('PATCH', base, { version, title: 'Another title' })
    expect([changed.status, changed.body.title, changed.body.version]).toEqual([200, 'Another title', version + 1])
    const stale = await at.lead.call<Refusal>('PATCH', base, { version, title: 'Too late' })
    expect([stale.status, stale.body.error.code, stale.body.error.current?.title]).toEqual([409, 'stale_version', 'Another title'])
    const log = await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=campaign:${changed.body.id}`)
    expect(log.body.items.at(-1)).toMatchObject({ action: 'change', detail: { title: { to: 'Another title' } } })
  })

  it('lets one of two through who change the same version at once', async () => {
    const { version } = (await at.lead.call<CampaignView>('GET', base)).body
    const answers = await Promise.all(['One', 'Two'].map(title => at.lead.call('PATCH', base, { version, title })))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
  })

  it('is refused to everyone else', async () => {
    for (const person of [at.analyst, at.observer, at.reader]) {
      expect((await person.call<Refusal>('PATCH', base, { version: 1, title: 'No' })).body.error.code).toBe('forbidden')
    }
  })
})

describe('stations and instruments', () => {
  it('are added by analysts and seen by readers', async () => {
    const station = await at.analyst.call<StationView>('POST', `${base}/stations`, { name: 'Lantern Point', latitude: 58.03, longitude: 6.51, altitude: 45 })
    expect([station.status, station.body.slug]).toEqual([201, 'lantern-point'])
    const instrument = await at.analyst.call<InstrumentView>('POST', `${base}/instruments`, { name: 'Grating', station: 'lantern-point', axisUnit: 'nm', medium: 'air' })
    expect([instrument.status, instrument.body]).toMatchObject([201, { station: 'lantern-point', medium: 'air', valueKind: null }])
    const seen = await at.reader.call<Page<InstrumentView>>('GET', `${base}/instruments`)
    expect(seen.body.items).toEqual([instrument.body])
    expect((await at.reader.call<Page<StationView>>('GET', `${base}/stations`)).body.items).toEqual([station.body])
  })

  it('are refused twice under one address, at an unknown station, off the globe, and to observers', async () => {
    expect((await at.analyst.call('POST', `${base}/stations`, { name: 'Lantern Point' })).status).toBe(409)
    const nowhere = await at.analyst.call<Refusal>('POST', `${base}/instruments`, { name: 'Lost', station: 'nowhere' })
    expect([nowhere.status, nowhere.body.error.fields?.[0]?.path]).toEqual([422, 'station'])
    expect((await at.analyst.call('POST', `${base}/stations`, { name: 'Beyond', latitude: 91 })).status).toBe(422)
    expect((await at.observer.call('POST', `${base}/stations`, { name: 'Mine' })).status).toBe(403)
  })
})

describe('recipes', () => {
  const recipe = (lines: string[]) => ({ name: 'OH 4-2', settings: { lineList: 'oh-meinel', bands: ['4-2'], lines } })

  it('are never changed: the same address makes the next version', async () => {
    const made = [await at.analyst.call<RecipeView>('POST', `${base}/recipes`, recipe(['P1(2)', 'P1(3)'])), await at.lead.call<RecipeView>('POST', `${base}/recipes`, recipe(['P1(2)', 'P1(5)']))]
    expect(made.map(answer => [answer.status, answer.body.address])).toEqual([[201, 'oh-4-2@1'], [201, 'oh-4-2@2']])
    const { items } = (await at.reader.call<Page<RecipeView>>('GET', `${base}/recipes`)).body
    expect(items.map(item => [item.version, item.newest, item.settings.lines[1]])).toEqual([[1, false, 'P1(3)'], [2, true, 'P1(5)']])
  })

  it('get different versions when several people make the next one at once', async () => {
    const answers = await Promise.all(Array.from({ length: 4 }, () => at.analyst.call<RecipeView>('POST', `${base}/recipes`, { name: 'Rush', settings: {} })))
    expect(answers.map(answer => answer.body.version).sort()).toEqual([1, 2, 3, 4])
  })

  it('may name only what their line list has', async () => {
    const wrong = await at.analyst.call<Refusal>('POST', `${base}/recipes`, { name: 'Wrong', settings: { lineList: 'oh-meinel', bands: ['4-2', '77-1'], lines: ['P1(99)'], strengthSet: 'guess' } })
    expect([wrong.status, wrong.body.error.fields?.map(field => field.path)]).toEqual([422, ['settings.bands.1', 'settings.lines.0', 'settings.strengthSet']])
    const unknown = await at.analyst.call<Refusal>('POST', `${base}/recipes`, { name: 'Wrong', settings: { temperatureRange: [10, 5] } })
    expect([unknown.status, unknown.body.error.fields?.[0]?.path]).toEqual([422, 'settings.temperatureRange'])
    expect((await at.observer.call('POST', `${base}/recipes`, { name: 'Mine' })).status).toBe(403)
  })
})

describe('pages of a list', () => {
  it('show every row once', async () => {
    for (let i = 0; i < 5; i++) await at.analyst.call('POST', `${base}/stations`, { name: `Post ${i}` })
    const names: string[] = []
    let cursor: string | null = ''
    do {
      const page: Page<StationView> = (await at.reader.call<Page<StationView>>('GET', `${base}/stations?limit=2${cursor && `&cursor=${cursor}`}`)).body
      names.push(...page.items.map(item => item.name))
      expect(page.total).toBe(6)
      cursor = page.nextCursor
    } while (cursor)
    expect(names).toEqual(['Lantern Point', 'Post 0', 'Post 1', 'Post 2', 'Post 3', 'Post 4'])
  })

  it('refuse a limit or a cursor that is none', async () => {
    for (const query of ['limit=0', 'limit=501', 'limit=x', 'cursor=7', 'page=2']) expect([query, (await at.reader.call('GET', `${base}/stations?${query}`)).status]).toEqual([query, 422])
  })
})

describe('another campaign', () => {
  it('is not found, by any call', async () => {
    const calls: [string, string, object?][] = [
      ['GET', base], ['PATCH', base, { version: 1, title: 'Mine' }],
      ...['members', 'stations', 'instruments', 'recipes', 'spectra'].map(part => ['GET', `${base}/${part}`] as [string, string]),
      ...['stations', 'instruments', 'recipes'].map(part => ['POST', `${base}/${part}`, { name: 'Mine' }] as [string, string, object]),
    ]
    for (const [method, path, body] of calls) expect([method, path, (await at.stranger.call(method, path, body)).status]).toEqual([method, path, 404])
    const administrator = caller(origin(), await tokenFor(connection, 'admin@trotline.example'))
    expect((await administrator('GET', base)).status).toBe(404)
  })

  it('keeps its logbook to itself, and its equipment out of ours', async () => {
    const objects = await rowsOf<{ object_kind: string, object_id: string }>(connection, 'SELECT DISTINCT object_kind, object_id FROM logbook WHERE campaign_id = (SELECT id FROM campaigns WHERE slug = ?)', [at.slug])
    expect(new Set(objects.map(row => row.object_kind))).toEqual(new Set(['campaign', 'station', 'instrument', 'recipe']))
    for (const { object_kind: kind, object_id: id } of objects) {
      expect((await at.stranger.call('GET', `/api/logbook?object=${kind}:${id}`)).status).toBe(404)
      expect((await at.reader.call('GET', `/api/logbook?object=${kind}:${id}`)).status).toBe(200)
    }
    const borrowed = await at.stranger.call('POST', `/api/campaigns/${at.otherSlug}/instruments`, { name: 'Borrowed', station: 'lantern-point' })
    expect(borrowed.status).toBe(422)
  })
})
