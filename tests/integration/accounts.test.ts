import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { connect, rowsOf } from '../helpers/accounts'
import { ApiClient, demoPassword, signedIn } from '../helpers/api-client'

const origin = process.env.TROTLINE_TEST_ORIGIN!
const email = 'observer@trotline.example'
let connection: Connection
beforeAll(async () => {
  connection = await connect(process.env.TROTLINE_TEST_DATABASE_URL!)
})
afterAll(() => connection.end())

const sessionIn = async (client: ApiClient) => (await client.fetch('/api/auth/session')).json() as Promise<{ user: Record<string, unknown> } | null>
const statusOfMe = async (client: ApiClient) => (await client.fetch('/api/me')).status

describe('signing in', () => {
  it('opens a session that pages and API know', async () => {
    const client = await signedIn(origin, email)
    expect((await sessionIn(client))?.user).toEqual({ id: expect.any(String), email, name: expect.any(String), isAdministrator: false, mailPreference: expect.any(String) })
    expect(await statusOfMe(client)).toBe(200)
  })

  it('takes the e-mail address in any case and with spaces around it', async () => {
    const client = new ApiClient(origin)
    expect((await client.signIn('  Observer@Trotline.Example ', demoPassword)).status).toBe(200)
  })

  it('answers a wrong password and an unknown address with the same words', async () => {
    const [wrong, unknown] = await Promise.all([
      new ApiClient(origin).signIn(email, 'not the password'),
      new ApiClient(origin).signIn('nobody@trotline.example', 'not the password'),
    ])
    expect([wrong.status, unknown.status]).toEqual([401, 401])
    expect(await wrong.json()).toEqual(await unknown.json())
  })

  it('takes as long for an unknown address as for a wrong password', async () => {
    const time = async (address: string) => {
      const client = new ApiClient(origin)
      const begun = performance.now()
      await client.signIn(address, 'not the password')
      return performance.now() - begun
    }
    const median = async (address: (index: number) => string) => {
      const times: number[] = []
      for (let index = 0; index < 9; index++) times.push(await time(address(index)))
      return times.sort((a, b) => a - b)[4]!
    }
    const unknown = await median(index => `nobody-${index}@trotline.example`)
    const wrong = await median(index => ['lead', 'analyst', 'reader', 'admin'][index % 4] + '@trotline.example')
    // Hashing takes some 15 ms of both; were it left out for unknown addresses, the ratio would be below a half.
    expect(unknown / wrong).toBeGreaterThan(0.6)
    expect(unknown / wrong).toBeLessThan(1.7)
  })

  it('is refused without the token of the form', async () => {
    const client = new ApiClient(origin)
    await client.fetch('/api/auth/csrf')
    await client.fetch('/api/auth/callback/credentials', { method: 'POST', body: new URLSearchParams({ email, password: demoPassword, csrfToken: 'made-up', json: 'true' }) })
    expect(await statusOfMe(client)).toBe(401)
  })

  it('is refused from a page of another site', async () => {
    const response = await new ApiClient(origin).fetch('/api/auth/callback/credentials', { method: 'POST', headers: { origin: 'https://elsewhere.example' }, body: new URLSearchParams({ email, password: demoPassword }) })
    expect(response.status).toBe(403)
  })

  it('is refused for a deactivated account, and its open session ends', async () => {
    const address = 'reader@trotline.example'
    const client = await signedIn(origin, address)
    await connection.query('UPDATE users SET deactivated_at = ? WHERE email = ?', [new Date(), address])
    try {
      expect(await statusOfMe(client)).toBe(401)
      expect((await new ApiClient(origin).signIn(address, demoPassword)).status).toBe(401)
    }
    finally {
      await connection.query('UPDATE users SET deactivated_at = NULL WHERE email = ?', [address])
    }
  })

  it('is slowed down after ten wrong passwords, with the time to wait, for that account alone', async () => {
    const target = `guessed-${Date.now()}@trotline.example`
    const client = new ApiClient(origin)
    for (let attempt = 0; attempt < 10; attempt++) expect((await client.signIn(target, 'guess')).status).toBe(401)
    const refused = await client.signIn(target, 'guess')
    expect(refused.status).toBe(429)
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(800)
    expect((await client.signIn(email, demoPassword)).status).toBe(200)
  })
})

describe('a session', () => {
  it('holds in its cookie nothing that can be read, and the cookie is out of reach of scripts', async () => {
    const client = new ApiClient(origin)
    const cookie = (await client.signIn(email, demoPassword)).headers.getSetCookie().find(value => value.includes('-session='))!
    expect(cookie).toMatch(/HttpOnly/i)
    expect(cookie).toMatch(/SameSite=Lax/i)
    expect(Buffer.from(cookie, 'base64').toString('latin1')).not.toContain(email)
  })

  it('ends with signing out, even for a copied cookie', async () => {
    const client = await signedIn(origin, email)
    const copy = client.copy()
    expect(await statusOfMe(copy)).toBe(200)
    expect((await client.signOut()).status).toBe(200)
    expect(await statusOfMe(copy)).toBe(401)
    expect(await sessionIn(copy)).toBeNull()
  })

  it('ends when its row has expired', async () => {
    const client = await signedIn(origin, email)
    const { user } = (await sessionIn(client))!
    await connection.query('UPDATE sessions SET expires_at = ? WHERE user_id = ?', [new Date(Date.now() - 1000), user.id])
    expect(await statusOfMe(client)).toBe(401)
  })

  it('notes when it was last seen at most once a minute', async () => {
    const client = await signedIn(origin, email)
    const { user } = (await sessionIn(client))!
    const lastSeen = async () => (await rowsOf<{ at: Date }>(connection, 'SELECT last_seen_at AS at FROM sessions WHERE user_id = ? ORDER BY id DESC LIMIT 1', [user.id]))[0]!.at.getTime()
    const before = await lastSeen()
    await client.fetch('/api/me')
    expect(await lastSeen()).toBe(before)
    await connection.query('UPDATE sessions SET last_seen_at = ? WHERE user_id = ?', [new Date(Date.now() - 61_000), user.id])
    await client.fetch('/api/me')
    await expect.poll(lastSeen, { timeout: 5000 }).toBeGreaterThanOrEqual(before)
  })

  it('is not taken from a cookie that was tampered with', async () => {
    const client = await signedIn(origin, email)
    const header = client.cookieHeader().replace(/(-session=[^;]{40})./, '$1~')
    expect((await fetch(`${origin}/api/me`, { headers: { cookie: header } })).status).toBe(401)
  })
})

describe('one\'s own account', () => {
  it('is changed with the version that was read, and a stale change is shown the current row', async () => {
    const client = await signedIn(origin, email)
    const me = await (await client.fetch('/api/me')).json() as { version: number, mailPreference: string }
    const changed = await client.fetch('/api/me', { method: 'PATCH', json: { mailPreference: 'none', version: me.version } })
    expect(await changed.json()).toMatchObject({ mailPreference: 'none', version: me.version + 1 })
    const stale = await client.fetch('/api/me', { method: 'PATCH', json: { mailPreference: 'each', version: me.version } })
    expect(stale.status).toBe(409)
    expect(await stale.json()).toMatchObject({ error: { code: 'stale_version', current: { mailPreference: 'none' } } })
    await client.fetch('/api/me', { method: 'PATCH', json: { mailPreference: me.mailPreference, version: me.version + 1 } })
  })

  it('cannot be made an administrator by its owner', async () => {
    const client = await signedIn(origin, email)
    const response = await client.fetch('/api/me', { method: 'PATCH', json: { isAdministrator: true, version: 1 } })
    expect(response.status).toBe(422)
  })
})
