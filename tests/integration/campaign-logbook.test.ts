import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CampaignView } from '#shared/schemas/campaign'
import type { LogbookView } from '#shared/schemas/logbook'
import type { Page } from '#shared/types/retrieval'
import { lineTable } from '../helpers/line-tables'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'

let connection: Connection
let at: TwoCampaigns
let slug: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'logbook')
  slug = (await at.lead.call<CampaignView>('POST', '/api/campaigns', { title: `Book ${at.slug}` })).body.slug
  const base = `/api/campaigns/${slug}`
  await at.lead.call('PATCH', base, { version: 1, title: 'Book', startsOn: '2026-01-01' })
  await at.lead.call('POST', `${base}/stations`, { name: 'Quiet Hill' })
  await at.lead.call('POST', `${base}/instruments`, { name: 'Eye', station: 'quiet-hill' })
  await at.lead.call('POST', `${base}/recipes`, { name: 'Plain' })
  await at.lead.call('POST', `${base}/retrievals`, { lineTable: lineTable(200, 'night 1'), hold: true })
})
afterAll(() => connection.end())

const read = async (query: string) => (await at.lead.call<Page<LogbookView>>('GET', `/api/logbook?campaign=${slug}${query}`)).body

describe('the logbook of a campaign', () => {
  it('holds everything that was done in it, the newest first, by the names things have now', async () => {
    const { items, total } = await read('')
    expect(items.map(({ action, object }) => [action, object.kind, object.name, object.address])).toEqual([
      ['submit', 'retrieval', 'night 1', null], ['create', 'recipe', 'Plain', 'plain@1'], ['create', 'instrument', 'Eye', 'eye'],
      ['create', 'station', 'Quiet Hill', 'quiet-hill'], ['change', 'campaign', 'Book', slug], ['create', 'campaign', 'Book', slug],
    ])
    expect(total).toBe(6)
    expect(items[4]!.detail).toEqual({ title: { from: `Book ${at.slug}`, to: 'Book' }, startsOn: { from: null, to: '2026-01-01' } })
  })

  it('is paged in either direction, and by kind', async () => {
    const seen: string[] = []
    let cursor: string | null = null
    do {
      const page: Page<LogbookView> = await read(`&limit=2${cursor ? `&cursor=${cursor}` : ''}`)
      seen.push(...page.items.map(entry => entry.id))
      cursor = page.nextCursor
    } while (cursor)
    expect(seen).toEqual((await read('')).items.map(entry => entry.id))
    expect((await read('&sort=at')).items.map(entry => entry.id)).toEqual([...seen].reverse())
    expect((await read('&kind=station')).items.map(entry => entry.object.name)).toEqual(['Quiet Hill'])
  })

  it('is read by members only', async () => {
    expect((await at.stranger.call('GET', `/api/logbook?campaign=${slug}`)).status).toBe(404)
    expect((await at.lead.call('GET', '/api/logbook?campaign=no-such-campaign')).status).toBe(404)
  })

  it('takes exactly one subject', async () => {
    for (const query of ['', `campaign=${slug}&object=campaign:01ARZ3NDEKTSV4RRFFQ69G5FAV`, `campaign=${slug}&sort=name`]) expect((await at.lead.call('GET', `/api/logbook?${query}`)).status).toBe(422)
  })
})
