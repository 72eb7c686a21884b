import { hash } from '@node-rs/argon2'
import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { DeviceView } from '#shared/types/account'
import { addAccount, rowsOf, type Account } from '../helpers/accounts'
import { ApiClient, signedIn } from '../helpers/api-client'
import { database, origin } from '../helpers/shared-service'

const [password, another] = ['a quiet cloud above', 'the same cloud at dawn']
let connection: Connection
let person: Account

beforeAll(async () => { connection = await database() })
beforeEach(async () => {
  person = await addAccount(connection, origin(), { name: 'devices' })
  await connection.query('UPDATE users SET password_hash = ? WHERE id = ?', [await hash(password), person.userId])
})
afterAll(() => connection.end())

const enter = (with_ = password) => signedIn(origin(), person.email, with_)
const devices = async (client: ApiClient) => ((await (await client.fetch('/api/me/devices')).json()) as { items: DeviceView[] }).items
const isIn = async (client: ApiClient) => (await client.fetch('/api/me')).status === 200
const change = (client: ApiClient, json: object) => client.fetch('/api/me/password', { method: 'POST', json })
const deeds = async () => (await rowsOf<{ action: string }>(connection, 'SELECT action FROM logbook WHERE object_kind = \'account\' AND object_id = ? ORDER BY id', [person.userId])).map(({ action }) => action)

describe('sign-ins', () => {
  it('are listed with the one that asks marked, and one of them can be ended', async () => {
    const [here, there] = [await enter(), await enter()]
    const list = await devices(here)
    expect(list.map(({ isThisOne }) => isThisOne).sort()).toEqual([false, true])
    const other = list.find(({ isThisOne }) => !isThisOne)!
    expect((await here.fetch(`/api/me/devices/${other.id}`, { method: 'DELETE' })).status).toBe(204)
    expect([await isIn(here), await isIn(there)]).toEqual([true, false])
    expect(await devices(here)).toHaveLength(1)
    expect((await here.fetch(`/api/me/devices/${other.id}`, { method: 'DELETE' })).status).toBe(404)
    expect(await deeds()).toEqual(['end-sign-in'])
  })

  it('of somebody else are not found and stay', async () => {
    const here = await enter()
    const [mine] = await devices(here)
    const stranger = await signedIn(origin(), 'reader@trotline.example')
    expect((await stranger.fetch(`/api/me/devices/${mine!.id}`, { method: 'DELETE' })).status).toBe(404)
    expect(await isIn(here)).toBe(true)
  })

  it('end everywhere else at once', async () => {
    const [here, ...others] = [await enter(), await enter(), await enter()]
    const answer = await here.fetch('/api/me/sign-out-elsewhere', { method: 'POST', json: {} })
    expect([answer.status, await answer.json()]).toEqual([200, { ended: 2 }])
    expect([await isIn(here), ...await Promise.all(others.map(isIn))]).toEqual([true, false, false])
  })

  it('are no business of a token', async () => {
    expect((await person.call('GET', '/api/me/devices')).status).toBe(403)
    expect((await person.call('POST', '/api/me/password', { current: password, next: another })).status).toBe(403)
  })
})

describe('a change of password', () => {
  it('needs the present one, ends the other sign-ins, and counts from then on', async () => {
    const [here, there] = [await enter(), await enter()]
    const wrong = await change(here, { current: 'not at all this one', next: another })
    expect([wrong.status, await wrong.json()]).toEqual([422, { error: expect.objectContaining({ fields: [{ path: 'current', message: 'This is not your present password.' }] }) }])
    expect((await change(here, { current: password, next: another })).status).toBe(204)
    expect([await isIn(here), await isIn(there)]).toEqual([true, false])
    expect((await new ApiClient(origin()).signIn(person.email, password)).ok).toBe(false)
    expect(await isIn(await enter(another))).toBe(true)
    expect(await deeds()).toEqual(['change-password'])
  })

  it('refuses a short one and the same one', async () => {
    const here = await enter()
    for (const next of ['short', password]) expect((await change(here, { current: password, next })).status).toBe(422)
    expect(await isIn(await enter())).toBe(true)
  })

  it('is not a place to guess passwords', async () => {
    const here = await enter()
    const statuses: number[] = []
    for (let i = 0; i < 12; i++) statuses.push((await change(here, { current: `guess number ${i}`, next: another })).status)
    expect(statuses).toEqual([...Array(10).fill(422), 429, 429])
    const late = await change(here, { current: password, next: another })
    expect([late.status, Number(late.headers.get('retry-after')) > 0]).toEqual([429, true])
  })
})
