import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Desk } from '#shared/types/desk'
import type { Page, RetrievalRow } from '#shared/types/retrieval'
import { rowsOf } from '../helpers/accounts'
import { settings } from '../helpers/batch-of-spectra'
import { lineTable } from '../helpers/line-tables'
import { apiRoutes } from '../helpers/routes'
import { database, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { eventually } from '../helpers/stack'

interface Refusal { error: { code: string, message: string, fields?: { path: string }[] } }

let connection: Connection
let at: TwoCampaigns
let batchId: string, id: string

const submitAs = (who: TwoCampaigns['observer'], body: object) => who.call<{ batchId: string, ids: string[] } & Refusal>('POST', `/api/campaigns/${at.slug}/retrievals`, body)

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'doors')
  const { body } = await submitAs(at.observer, { lineTable: lineTable(187.4, 'behind the door') })
  batchId = body.batchId
  id = body.ids[0]!
  await eventually(async () => (await at.observer.call<{ phase: string }>('GET', `/api/retrievals/${id}`)).body.phase === 'COMPLETED', 'it is done')
})
afterAll(() => connection.end())

/** Every route that addresses one retrieval or batch, from the files: a new one is tried without being listed here. */
const routes = apiRoutes().filter(({ file }) => /^server\/api\/(retrievals|batches)\/\[id\]/.test(file))
const bodies: Record<string, object> = { review: { verdict: 'accept' }, revise: { settings: { seed: 2 } } }
const bodyFor = (path: string) => bodies[path.split('/').at(-1)!]
const addressOf = ({ path }: { path: string }) => path.replace(/\/(retrievals|batches)\/\w{26}/, (_, kind: string) => `/${kind}/${kind === 'batches' ? batchId : id}`)

describe('retrievals and batches of another campaign', () => {
  it('have routes to be tried', () => expect(routes.length).toBeGreaterThanOrEqual(9))

  it.each(routes.map(route => [route.method, route.path, route] as const))('are not found: %s %s', async (method, path, route) => {
    const { status, body } = await at.stranger.call<Refusal>(method, addressOf(route), bodyFor(path))
    expect([status, body.error.code]).toEqual([404, 'not_found'])
  })

  it('are in no list, no export and on no desk', async () => {
    for (const filter of ['', `&campaign=${at.slug}`, `&batch=${batchId}`, '&q=behind']) {
      expect((await at.stranger.call<Page<RetrievalRow>>('GET', `/api/retrievals?limit=1${filter}`)).body).toMatchObject({ items: [], total: 0 })
      const csv = String((await at.stranger.call('GET', `/api/exports/retrievals?format=csv${filter}`)).body)
      expect(csv.trim().split('\r\n')).toHaveLength(1)
    }
    expect(JSON.stringify((await at.stranger.call('GET', '/api/desk')).body)).not.toContain(id)
    expect((await at.stranger.call('GET', `/api/logbook?object=retrieval:${id}`)).status).toBe(404)
  })

  it('take no submission', async () => {
    const { status } = await at.stranger.call('POST', `/api/campaigns/${at.slug}/retrievals`, { lineTable: lineTable(150) })
    expect(status).toBe(404)
  })
})

describe('a reader of the campaign', () => {
  it.each(routes.filter(route => route.method !== 'GET').map(route => [route.method, route.path, route] as const))('may not: %s %s', async (method, path, route) => {
    expect((await at.reader.call<Refusal>(method, addressOf(route), bodyFor(path))).status).toBe(403)
  })

  it('may look, and export', async () => {
    for (const path of [`/api/retrievals/${id}`, `/api/batches/${batchId}`, `/api/batches/${batchId}/events`]) expect([path, (await at.reader.call('GET', path)).status]).toEqual([path, 200])
    expect(String((await at.reader.call('GET', `/api/exports/retrievals?campaign=${at.slug}`)).body)).toContain('behind the door')
    expect((await submitAs(at.reader, { lineTable: lineTable(150) })).status).toBe(403)
  })

  it('leaves the retrieval as it was', async () => {
    expect(await rowsOf(connection, 'SELECT phase, revision, verdict FROM retrievals WHERE id = ?', [id])).toEqual([{ phase: 'COMPLETED', revision: 1, verdict: null }])
  })
})

describe('a method that the engine does not have', () => {
  const methods = ['spectrum', 'two-temperature', 'optical-depth']

  it.each(methods)('%s is refused for a recipe, for a submission and for a revision', async (method) => {
    const answers = [
      await at.lead.call<Refusal>('POST', `/api/campaigns/${at.slug}/recipes`, { name: `By ${method}`, settings: { ...settings, method } }),
      await submitAs(at.observer, { lineTable: lineTable(150), settings: { method } }),
      await at.observer.call<Refusal>('POST', `/api/retrievals/${id}/revise`, { settings: { method } }),
    ]
    for (const { status, body } of answers) {
      expect([status, body.error.code, body.error.fields?.map(field => field.path)]).toEqual([422, 'validation_failed', ['settings.method']])
      expect(body.error.message).toContain(`The method ${method} is not available`)
    }
    expect((await at.observer.call<{ revision: number }>('GET', `/api/retrievals/${id}`)).body.revision).toBe(1)
  })
})

describe('the desk', () => {
  it('shows a lead and an analyst who own nothing what came back to their observers', async () => {
    for (const who of [at.lead, at.analyst]) {
      const { body } = await who.call<Desk>('GET', '/api/desk')
      expect(body.cameBackTo).toBe('campaigns')
      expect(body.cameBack.items.map(row => row.id)).toContain(id)
    }
  })

  it('shows everyone their own once they have some, and readers nobody else\'s', async () => {
    const observer = (await at.observer.call<Desk>('GET', '/api/desk')).body
    expect([observer.cameBackTo, observer.cameBack.items.map(row => row.id)]).toEqual(['me', [id]])
    expect((await at.reader.call<Desk>('GET', '/api/desk')).body.cameBack).toEqual({ items: [], total: 0 })
    const { body } = await submitAs(at.analyst, { lineTable: lineTable(160, 'my own') })
    const mine = await eventually(async () => {
      const desk = (await at.analyst.call<Desk>('GET', '/api/desk')).body
      return desk.cameBackTo === 'me' && desk
    }, 'the analyst\'s own came back')
    expect(mine.cameBack.items.map(row => row.id)).toEqual(body.ids)
  })
})
