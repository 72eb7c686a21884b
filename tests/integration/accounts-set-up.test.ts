import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { connect, rowsOf } from '../helpers/accounts'
import { ApiClient, signedIn } from '../helpers/api-client'

const origin = process.env.TROTLINE_TEST_ORIGIN!
const databaseUrl = process.env.TROTLINE_TEST_DATABASE_URL!
const email = 'first@trotline.example'
const password = 'long enough words'
let connection: Connection
let administrators: string[]

const printLink = async () => (await promisify(execFile)('node', ['docker-free-scripts/set-up-link.mjs'], { env: { ...process.env, TROTLINE_DATABASE_URL: databaseUrl, TROTLINE_ORIGIN: origin } })).stdout.trim()
const tokenOf = (link: string) => link.split('/').at(-1)!
const setUp = (token: string, address = email) => new ApiClient(origin).fetch('/api/set-up', { method: 'POST', json: { token, email: address, name: 'First', password } })

// As on an installation without an administrator.
beforeAll(async () => {
  connection = await connect(databaseUrl)
  administrators = (await rowsOf<{ id: string }>(connection, 'SELECT id FROM users WHERE is_administrator')).map(({ id }) => id)
  await connection.query('UPDATE users SET is_administrator = 0')
})
afterAll(async () => {
  await connection.query('DELETE FROM users WHERE email LIKE ?', ['first%@trotline.example'])
  await connection.query('UPDATE users SET is_administrator = 1 WHERE id IN (?)', [administrators])
  await connection.end()
})

describe('the first administrator', () => {
  it('needs a password of at least twelve characters, and a slip does not use up the link', async () => {
    const link = await printLink()
    expect(link).toMatch(new RegExp(`^${origin}/set-up/[\\w-]{43}$`))
    const response = await new ApiClient(origin).fetch('/api/set-up', { method: 'POST', json: { token: tokenOf(link), email, name: 'First', password: 'too short' } })
    expect(response.status).toBe(422)
    expect(await response.json()).toMatchObject({ error: { fields: [{ path: 'password', message: expect.stringContaining('at least 12') }] } })
    const [row] = await rowsOf<{ used: Date | null }>(connection, 'SELECT used_at AS used FROM one_time_links ORDER BY id DESC LIMIT 1')
    expect(row!.used).toBeNull()
  })

  it('is not made by a link that is too old or was replaced by a newer one', async () => {
    const older = tokenOf(await printLink())
    const newer = tokenOf(await printLink())
    expect((await setUp(older)).status).toBe(404)
    await connection.query('UPDATE one_time_links SET expires_at = ? WHERE used_at IS NULL', [new Date(Date.now() - 1000)])
    expect((await setUp(newer)).status).toBe(404)
  })

  it('is made once, even when the link is opened several times at once, and can sign in', async () => {
    const token = tokenOf(await printLink())
    const answers = await Promise.all([0, 1, 2, 3].map(index => setUp(token, index ? `first-${index}@trotline.example` : email)))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 404, 404, 404])
    const made = await rowsOf<{ email: string }>(connection, 'SELECT email FROM users WHERE is_administrator')
    expect(made).toHaveLength(1)
    const client = await signedIn(origin, made[0]!.email, password)
    expect(await (await client.fetch('/api/me')).json()).toMatchObject({ isAdministrator: true })
  })

  it('gets no further link printed', async () => {
    expect(await printLink()).toBe('')
  })
})
