import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CampaignView } from '#shared/schemas/campaign'
import type { LogbookView } from '#shared/schemas/logbook'
import type { Page } from '#shared/types/retrieval'
import { addAccount } from '../helpers/accounts'
import { database, origin, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'

interface Refusal { error: { code: string, message: string, fields?: { path: string, message: string }[], current?: CampaignView } }

let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'settings')
  base = `/api/campaigns/${at.slug}`
})
afterAll(() => connection.end())

const now = async () => (await at.lead.call<CampaignView>('GET', base)).body
const patch = async (change: object) => at.lead.call<CampaignView & Refusal>('PATCH', base, { version: (await now()).version, ...change })

describe('the settings of a campaign', () => {
  it('are kept as they were written: long text, direction marks, emoji and quotes too', async () => {
    const title = '“Ridge” \u200Fלילה\u200E 🔭 <b>\'night\'</b> & co'
    const description = `${'Long words. '.repeat(1500)}\n\nسطر`
    const changed = await patch({ title, description, startsOn: '2026-01-01', endsOn: '2026-03-31', kind: 'comet' })
    expect(changed.status).toBe(200)
    expect(await now()).toMatchObject({ title, description: description.trim(), startsOn: '2026-01-01', endsOn: '2026-03-31', kind: 'comet' })
  })

  it('are checked with what stays: a last day before the first is refused', async () => {
    const refused = await patch({ endsOn: '2025-12-31' })
    expect([refused.status, refused.body.error.fields]).toEqual([422, [{ path: 'endsOn', message: 'The last day is before the first one.' }]])
    expect((await patch({ startsOn: '31.12.2025' })).status).toBe(422)
    expect((await patch({ startsOn: null, endsOn: null })).body).toMatchObject({ startsOn: null, endsOn: null })
  })

  it('say what is wrong in words, beside the field', async () => {
    const refused = await patch({ title: 'x'.repeat(201), description: 'x'.repeat(20_001), slug: 'No Good', visibility: 'everyone' })
    expect(refused.body.error.fields).toEqual(expect.arrayContaining([
      { path: 'title', message: 'The title takes at most 200 characters.' },
      { path: 'description', message: 'The description takes at most 20,000 characters.' },
      { path: 'slug', message: 'Use small letters, digits and single hyphens, for example hollow-ridge.' },
      { path: 'visibility', message: 'Choose who may read it.' },
    ]))
  })

  it('are not touched by a change that changes nothing', async () => {
    const before = await now()
    expect((await patch({ title: before.title, kind: before.kind })).body.version).toBe(before.version)
  })

  it('cannot be changed with a version that is stale, even to what they are', async () => {
    const before = await now()
    await patch({ selfReview: !before.selfReview })
    const stale = await at.lead.call<Refusal>('PATCH', base, { version: before.version, title: before.title })
    expect([stale.status, stale.body.error.code, stale.body.error.current?.version]).toEqual([409, 'stale_version', before.version + 1])
  })
})

describe('a changed address', () => {
  it('keeps the old one working, for reading, changing and filtering', async () => {
    const moved = `${at.slug}-moved`
    expect((await patch({ slug: moved })).body.slug).toBe(moved)
    expect((await at.reader.call<CampaignView>('GET', base)).body.slug).toBe(moved)
    expect((await at.reader.call<CampaignView>('GET', `/api/campaigns/${moved}`)).body.slug).toBe(moved)
    expect((await at.analyst.call('POST', `${base}/stations`, { name: 'By the old address' })).status).toBe(201)
    const old = await at.reader.call<Page<unknown>>('GET', `/api/retrievals?campaign=${at.slug}`)
    expect([old.status, old.body.total]).toEqual([200, 0])
    expect((await at.stranger.call('GET', `/api/campaigns/${moved}`)).status).toBe(404)
  })

  it('is never given to another campaign, neither when it is made nor when it is changed', async () => {
    const taken = await at.stranger.call<Refusal>('POST', '/api/campaigns', { title: 'Squatter', slug: at.slug })
    expect([taken.status, taken.body.error.fields?.[0]?.path]).toEqual([409, 'slug'])
    const other = (await at.stranger.call<CampaignView>('GET', `/api/campaigns/${at.otherSlug}`)).body
    expect((await at.stranger.call('PATCH', `/api/campaigns/${at.otherSlug}`, { version: other.version, slug: at.slug })).status).toBe(409)
    expect((await at.stranger.call('PATCH', `/api/campaigns/${at.otherSlug}`, { version: other.version, slug: `${at.slug}-moved` })).status).toBe(409)
    const named = await at.stranger.call<CampaignView>('POST', '/api/campaigns', { title: at.slug })
    expect(named.body.slug).toBe(`${at.slug}-2`)
  })

  it('can be taken back by the campaign itself', async () => {
    expect((await patch({ slug: at.slug })).body.slug).toBe(at.slug)
    expect((await at.reader.call<CampaignView>('GET', `/api/campaigns/${at.slug}-moved`)).body.slug).toBe(at.slug)
  })

  it('is no word that the pages use themselves', async () => {
    expect((await patch({ slug: 'new' })).body.error.fields?.[0]?.path).toBe('slug')
    const made = await at.lead.call<CampaignView>('POST', '/api/campaigns', { title: 'New' })
    expect(made.body.slug).not.toBe('new')
  })
})

describe('a campaign that every account may read', () => {
  const parts = ['', '/members', '/stations', '/instruments', '/recipes', '/spectra']
  const listed = async () => (await at.stranger.call<Page<CampaignView>>('GET', '/api/campaigns?limit=500')).body.items.find(item => item.slug === at.slug)

  it('is hidden from strangers until its lead opens it, and then read by them as by a Reader', async () => {
    for (const part of parts) expect([part, (await at.stranger.call('GET', `${base}${part}`)).status]).toEqual([part, 404])
    expect(await listed()).toBeUndefined()
    expect((await at.analyst.call('PATCH', base, { version: (await now()).version, visibility: 'service' })).status).toBe(403)
    expect((await patch({ visibility: 'service' })).body.visibility).toBe('service')
    for (const part of parts) expect([part, (await at.stranger.call('GET', `${base}${part}`)).status]).toEqual([part, 200])
    expect(await listed()).toMatchObject({ role: 'reader', member: false })
    expect((await at.stranger.call('GET', `/api/logbook?campaign=${at.slug}`)).status).toBe(200)
    expect((await at.stranger.call('GET', `/api/retrievals?campaign=${at.slug}`)).status).toBe(200)
  })

  it('is changed by none of them', async () => {
    const calls: [string, string, object?][] = [
      ['PATCH', base, { version: 1, title: 'Mine' }], ['POST', `${base}/archive`], ['POST', `${base}/unarchive`],
      ...['stations', 'instruments', 'recipes'].map(part => ['POST', `${base}/${part}`, { name: 'Mine' }] as [string, string, object]),
      ['POST', `${base}/retrievals`, { lineTable: { observable: 'photon-emission', lines: [{ label: 'a', intensity: 1 }] } }],
      ['POST', `${base}/spectra`, { name: 'mine', axis: [1, 2], values: [1, 2] }],
    ]
    for (const [method, path, body] of calls) {
      const answer = await at.stranger.call<Refusal>(method, path, body)
      expect([method, path, answer.status, answer.body.error.code]).toEqual([method, path, 403, 'forbidden'])
    }
  })

  it('leaves the members as they are: their roles, their desks, and who may do what', async () => {
    const roles = await Promise.all([at.lead, at.analyst, at.observer, at.reader].map(async person => (await person.call<CampaignView>('GET', base)).body))
    expect(roles.map(({ role, member }) => [role, member])).toEqual([['lead', true], ['analyst', true], ['observer', true], ['reader', true]])
    expect((await at.analyst.call('POST', `${base}/stations`, { name: 'Open house' })).status).toBe(201)
    expect((await at.reader.call('POST', `${base}/stations`, { name: 'No' })).status).toBe(403)
    expect((await fetch(`${origin()}${base}`)).status).toBe(401)
  })

  it('is counted among the campaigns of someone who belongs to none, and is gone when it is closed', async () => {
    const visitor = await addAccount(connection, origin(), { name: 'visitor' })
    const open = (await visitor.call<Page<CampaignView>>('GET', '/api/campaigns?limit=500')).body
    expect([open.items.some(item => item.slug === at.slug), open.total]).toEqual([true, open.items.length])
    await patch({ visibility: 'members' })
    for (const part of parts) expect((await visitor.call('GET', `${base}${part}`)).status).toBe(404)
    expect(await listed()).toBeUndefined()
  })
})

describe('an archived campaign', () => {
  it('is archived and brought back by its lead only, and says so in the logbook', async () => {
    for (const person of [at.analyst, at.observer, at.reader]) expect((await person.call('POST', `${base}/archive`)).status).toBe(403)
    expect((await at.stranger.call('POST', `${base}/archive`)).status).toBe(404)
    const archived = await at.lead.call<CampaignView>('POST', `${base}/archive`)
    expect([archived.status, archived.body.archivedAt]).toEqual([200, expect.any(String)])
    expect((await at.lead.call<CampaignView>('POST', `${base}/archive`)).body).toEqual(archived.body)
  })

  it('is read as before and left as it is', async () => {
    for (const path of [base, `${base}/stations`, `/api/logbook?campaign=${at.slug}`]) expect((await at.reader.call('GET', path)).status).toBe(200)
    const calls: [string, string, object][] = [
      ['PATCH', base, { version: 1, title: 'Late' }], ['POST', `${base}/stations`, { name: 'Late' }], ['POST', `${base}/instruments`, { name: 'Late' }],
      ['POST', `${base}/recipes`, { name: 'Late' }], ['POST', `${base}/spectra`, { name: 'late', axis: [1, 2], values: [1, 2] }],
      ['POST', `${base}/retrievals`, { lineTable: { observable: 'photon-emission', lines: [{ label: 'a', intensity: 1 }] } }],
    ]
    for (const [method, path, body] of calls) {
      const answer = await at.lead.call<Refusal>(method, path, body)
      expect([path, answer.status, answer.body.error.code]).toEqual([path, 409, 'archived'])
      expect(answer.body.error.message).toContain('is archived')
    }
  })

  it('goes on once it is brought back', async () => {
    expect((await at.lead.call<CampaignView>('POST', `${base}/unarchive`)).body.archivedAt).toBeNull()
    expect((await at.analyst.call('POST', `${base}/stations`, { name: 'Again' })).status).toBe(201)
    const log = await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?campaign=${at.slug}&kind=campaign&limit=2`)
    expect(log.body.items.map(entry => [entry.action, entry.actor])).toEqual([['unarchive', 'lead'], ['archive', 'lead']])
  })
})
