import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { LineList, LineListSummary } from '#shared/types/line-list'
import type { Page } from '#shared/types/retrieval'
import { addAccount, type Account } from '../helpers/accounts'
import { database, origin } from '../helpers/shared-service'

let connection: Connection
let person: Account

beforeAll(async () => {
  connection = await database()
  person = await addAccount(connection, origin(), { name: 'looker' })
})
afterAll(() => connection.end())

describe('line lists', () => {
  it('are summed up with their strength sets and the source of each', async () => {
    const { body } = await person.call<Page<LineListSummary>>('GET', '/api/line-lists')
    expect(body.items.map(list => list.id)).toEqual(['oh-meinel', 'co-rotation'])
    expect(body.items.flatMap(list => list.strengthSets).every(set => set.citation.length > 20)).toBe(true)
  })

  it('come in full once, and are then only asked whether they are still the same', async () => {
    const headers = { authorization: `Bearer ${person.token}` }
    const first = await fetch(`${origin()}/api/line-lists/oh-meinel`, { headers })
    expect(first.headers.get('cache-control')).toContain('max-age=86400')
    const list = await first.json() as LineList
    expect(list.bands.find(band => band.id === '4-2')?.recommendedLines).toContain('P1(2)')
    const again = await fetch(`${origin()}/api/line-lists/oh-meinel`, { headers: { ...headers, 'if-none-match': first.headers.get('etag')! } })
    expect([again.status, await again.text()]).toEqual([304, ''])
  })

  it('are not found under a name that none has, and not given to those who are not signed in', async () => {
    for (const id of ['ammonia', '__proto__', 'constructor', '..%2Fsummaries']) expect([id, (await person.call('GET', `/api/line-lists/${id}`)).status]).toEqual([id, 404])
    expect((await fetch(`${origin()}/api/line-lists/oh-meinel`)).status).toBe(401)
  })
})
