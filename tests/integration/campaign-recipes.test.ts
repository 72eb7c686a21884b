import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { LogbookView } from '#shared/schemas/logbook'
import type { RecipeDetail, RecipeView } from '#shared/schemas/recipe'
import type { Page } from '#shared/types/retrieval'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'

interface Refusal { error: { code: string, fields?: { path: string }[], current?: RecipeDetail } }

let connection: Connection
let at: TwoCampaigns
let base: string
const settings = { lineList: 'oh-meinel', bands: ['4-2'], lines: ['P1(2)', 'P1(3)'] }

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'recipes')
  base = `/api/campaigns/${at.slug}/recipes`
  await at.analyst.call('POST', base, { name: 'OH 4-2', settings })
})
afterAll(() => connection.end())

const read = async (address: string) => (await at.reader.call<RecipeDetail>('GET', `${base}/${address}`)).body
const change = (body: object, address = 'oh-4-2') => at.analyst.call<RecipeDetail & Refusal>('PATCH', `${base}/${address}`, body)

describe('a recipe', () => {
  it('is changed by its next version; the one before stays what it was', async () => {
    const changed = await change({ version: 1, settings: { ...settings, lines: ['P1(2)', 'P1(4)'], continuumOrder: 2 } })
    expect([changed.status, changed.body.address, changed.body.newest]).toEqual([200, 'oh-4-2@2', true])
    const [first, second, plain] = await Promise.all(['oh-4-2@1', 'oh-4-2@2', 'oh-4-2'].map(read))
    expect([first!.settings.lines, first!.newest, second!.settings.lines]).toEqual([['P1(2)', 'P1(3)'], false, ['P1(2)', 'P1(4)']])
    expect(plain).toEqual(second)
    expect(plain!.versions.map(({ address, createdBy, retrievals }) => [address, createdBy, retrievals])).toEqual([['oh-4-2@1', 'analyst', 0], ['oh-4-2@2', 'analyst', 0]])
  })

  it('gets no version for a change that changes nothing', async () => {
    const { settings: now, name } = await read('oh-4-2')
    expect((await change({ version: 2, settings: now, name })).body.version).toBe(2)
  })

  it('answers a change of a version that is not the newest with the newest', async () => {
    const stale = await change({ version: 1, name: 'Too late' })
    expect([stale.status, stale.body.error.code, stale.body.error.current?.address]).toEqual([409, 'stale_version', 'oh-4-2@2'])
  })

  it('lets one of several through who change the same version at once', async () => {
    const answers = await Promise.all(Array.from({ length: 4 }, (_, i) => change({ version: 2, name: `Rush ${i}` })))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409, 409, 409])
    expect((await read('oh-4-2')).version).toBe(3)
  })

  it('is refused settings that its line list does not have, at their place', async () => {
    const refused = await change({ version: 3, settings: { ...settings, lines: ['P1(99)'] } })
    expect([refused.status, refused.body.error.fields?.[0]?.path]).toEqual([422, 'settings.lines.0'])
    expect((await change({ version: 3, slug: 'other' })).body.error.fields?.[0]?.path).toBe('slug')
  })

  it('is read by readers and changed by analysts and leads only', async () => {
    for (const person of [at.observer, at.reader]) {
      expect((await person.call('PATCH', `${base}/oh-4-2`, { version: 3, name: 'No' })).status).toBe(403)
      expect((await person.call('POST', `${base}/oh-4-2/archive`)).status).toBe(403)
    }
    for (const address of ['oh-4-2', 'oh-4-2@1']) {
      for (const [method, tail] of [['GET', ''], ['PATCH', ''], ['POST', '/archive'], ['POST', '/unarchive']] as const) {
        const body = method === 'PATCH' ? { version: 3, name: 'Mine' } : undefined
        expect((await at.stranger.call(method, `${base}/${address}${tail}`, body)).status).toBe(404)
        expect((await at.stranger.call(method, `/api/campaigns/${at.otherSlug}/recipes/${address}${tail}`, body)).status).toBe(404)
      }
    }
  })

  it('is not found under an address that names none', async () => {
    for (const address of ['oh-4-2@99', 'oh-4-2@0', 'oh-4-2@x', 'OH', 'nothing', 'oh-4-2@1@2']) expect([address, (await at.reader.call('GET', `${base}/${encodeURIComponent(address)}`)).status]).toEqual([address, 404])
  })
})

describe('an archived recipe', () => {
  it('is archived with all its versions, makes no next one, and comes back with all', async () => {
    const archived = (await at.analyst.call<RecipeDetail>('POST', `${base}/oh-4-2@1/archive`)).body
    expect(archived.archivedAt).toEqual(expect.any(String))
    const list = (await at.reader.call<Page<RecipeView>>('GET', base)).body.items
    expect(list.map(item => item.archivedAt)).toEqual([archived.archivedAt, archived.archivedAt, archived.archivedAt])
    expect((await change({ version: 3, name: 'Late' })).body.error.code).toBe('archived')
    const again = await at.analyst.call<Refusal>('POST', base, { name: 'OH 4-2', settings })
    expect([again.status, again.body.error.code, again.body.error.fields?.[0]?.path]).toEqual([409, 'archived', 'slug'])
    await at.analyst.call('POST', `${base}/oh-4-2/unarchive`)
    expect((await at.reader.call<Page<RecipeView>>('GET', base)).body.items.map(item => item.archivedAt)).toEqual([null, null, null])
  })

  it('has all versions in its logbook, field by field', async () => {
    const { id } = await read('oh-4-2@1')
    const log = (await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=recipe:${id}`)).body.items
    expect(log.map(entry => [entry.action, entry.object.address])).toEqual([['create', 'oh-4-2@1'], ['change', 'oh-4-2@2'], ['change', 'oh-4-2@3'], ['archive', 'oh-4-2@3'], ['unarchive', 'oh-4-2@3']])
    expect(log[1]!.detail).toEqual({
      'version': { from: 1, to: 2 },
      'settings.lines': { from: ['P1(2)', 'P1(3)'], to: ['P1(2)', 'P1(4)'] },
      'settings.continuumOrder': { from: 1, to: 2 },
    })
    expect((await at.stranger.call('GET', `/api/logbook?object=recipe:${id}`)).status).toBe(404)
  })

  it('of which nothing can stand in an address does not become a version of another such', async () => {
    const made = [await at.analyst.call<RecipeView>('POST', base, { name: '🔭' }), await at.analyst.call<RecipeView>('POST', base, { name: '氷' })]
    expect(made.map(answer => answer.body.address)).toEqual(['recipe@1', 'recipe-2@1'])
  })
})
