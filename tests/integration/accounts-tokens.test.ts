import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { connect, rowsOf } from '../helpers/accounts'
import { signedIn, type ApiClient } from '../helpers/api-client'

const origin = process.env.TROTLINE_TEST_ORIGIN!
const databaseUrl = process.env.TROTLINE_TEST_DATABASE_URL!
const email = 'analyst@trotline.example'
interface Made { id: string, token: string }
let client: ApiClient
let connection: Connection
beforeAll(async () => {
  client = await signedIn(origin, email)
  connection = await connect(databaseUrl)
})
afterAll(() => connection.end())

const make = async (scope: 'read' | 'submit') => (await client.fetch('/api/me/tokens', { method: 'POST', json: { name: 'station', scope } })).json() as Promise<Made>
const ask = (token: string, path = '/api/me', init: RequestInit = {}) => fetch(`${origin}${path}`, { ...init, headers: { 'authorization': `Bearer ${token}`, 'content-type': 'application/json' } })
const codeOf = async (response: Response) => [response.status, ((await response.json()) as { error?: { code: string } }).error?.code]

describe('an API token', () => {
  it('is shown once, listed without its text, and stored only as a hash', async () => {
    const { id, token } = await make('read')
    expect(token).toMatch(/^trl_[\w-]{43}$/)
    const listed = await (await client.fetch('/api/me/tokens')).text()
    expect(listed).toContain(id)
    expect(listed).not.toContain(token)
    const [row] = await rowsOf<{ token_hash: string }>(connection, 'SELECT * FROM api_tokens WHERE id = ?', [id])
    expect(row!.token_hash).toMatch(/^[0-9a-f]{64}$/)
    expect(JSON.stringify(row)).not.toContain(token)
  })

  it('of scope read reads and changes nothing', async () => {
    const { token } = await make('read')
    expect((await ask(token)).status).toBe(200)
    expect(await codeOf(await ask(token, '/api/me', { method: 'PATCH', body: '{"version":1}' }))).toEqual([403, 'insufficient_scope'])
  })

  it('of scope submit changes without an Origin, as scripts do', async () => {
    const { token } = await make('submit')
    const { version } = await (await ask(token)).json() as { version: number }
    expect((await ask(token, '/api/me', { method: 'PATCH', body: JSON.stringify({ version }) })).status).toBe(200)
  })

  it('that has expired is refused and says so', async () => {
    const { id, token } = await make('read')
    await connection.query('UPDATE api_tokens SET expires_at = ? WHERE id = ?', [new Date(Date.now() - 1000), id])
    expect(await codeOf(await ask(token))).toEqual([401, 'token_expired'])
  })

  it('that was removed is refused', async () => {
    const { id, token } = await make('read')
    expect((await client.fetch(`/api/me/tokens/${id}`, { method: 'DELETE' })).status).toBe(204)
    expect(await codeOf(await ask(token))).toEqual([401, 'unauthenticated'])
  })

  it('that is wrong is refused even beside a good session', async () => {
    expect((await client.fetch('/api/me', { headers: { authorization: 'Bearer trl_made-up' } })).status).toBe(401)
    expect((await client.fetch('/api/me', { headers: { authorization: 'Basic abc' } })).status).toBe(401)
  })

  it('cannot make or remove tokens', async () => {
    const { id, token } = await make('submit')
    expect(await codeOf(await ask(token, '/api/me/tokens', { method: 'POST', body: '{"name":"heir","scope":"submit"}' }))).toEqual([403, 'forbidden'])
    expect(await codeOf(await ask(token, `/api/me/tokens/${id}`, { method: 'DELETE' }))).toEqual([403, 'forbidden'])
  })

  it('of somebody else is not found', async () => {
    const { id } = await make('read')
    const other = await signedIn(origin, 'observer@trotline.example')
    expect((await other.fetch(`/api/me/tokens/${id}`, { method: 'DELETE' })).status).toBe(404)
  })

  it('remembers when it was used', async () => {
    const { id, token } = await make('read')
    await ask(token)
    const used = async () => (await rowsOf<{ at: Date | null }>(connection, 'SELECT last_used_at AS at FROM api_tokens WHERE id = ?', [id]))[0]!.at
    await expect.poll(used, { timeout: 5000 }).toBeInstanceOf(Date)
  })

  it('is made on the command line too, on the last line of its output', async () => {
    const { stdout } = await promisify(execFile)('node', ['docker-free-scripts/token.mjs', email, 'read'], { env: { ...process.env, TROTLINE_DATABASE_URL: databaseUrl } })
    const token = stdout.trim().split('\n').at(-1)!
    expect((await ask(token)).status).toBe(200)
  })

  it('is not made on the command line for an account that is not there', async () => {
    const attempt = promisify(execFile)('node', ['docker-free-scripts/token.mjs', 'nobody@trotline.example'], { env: { ...process.env, TROTLINE_DATABASE_URL: databaseUrl } })
    await expect(attempt).rejects.toMatchObject({ code: 1, stderr: expect.stringContaining('There is no account') })
  })
})
