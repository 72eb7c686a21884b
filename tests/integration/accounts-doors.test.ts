import { describe, expect, it } from 'vitest'
import { ApiClient, signedIn } from '../helpers/api-client'
import { apiRoutes, pages } from '../helpers/routes'

const origin = process.env.TROTLINE_TEST_ORIGIN!
const openRoutes = ['GET /api/health', 'GET /api/openapi.json', 'GET /api/ready', 'POST /api/invitations/accept', 'POST /api/invitations/look', 'POST /api/set-up']
const openPages = ['app/pages/invitations/[token].vue', 'app/pages/set-up/[token].vue', 'app/pages/sign-in.vue']
const nameOf = ({ method, path }: { method: string, path: string }) => `${method} ${path}`
const body = (method: string): RequestInit & { json?: unknown } => (method === 'GET' || method === 'DELETE' ? { method } : { method, json: {} })
const codeOf = async (response: Response) => ((await response.json()) as { error: { code: string } }).error.code

describe('every API route', () => {
  const routes = apiRoutes()
  const closed = routes.filter(route => !openRoutes.includes(nameOf(route)))

  it('is found by this test, and the open ones are exactly those meant to be open', () => {
    expect(closed.length).toBeGreaterThan(20)
    expect(routes.filter(({ source }) => /access: 'public'/.test(source)).map(nameOf).sort()).toEqual(openRoutes)
  })

  it.each(closed.map(route => [nameOf(route), route] as const))('%s is closed without credentials', async (_name, { method, path }) => {
    const response = await new ApiClient(origin).fetch(path, body(method))
    expect([response.status, await codeOf(response)]).toEqual([401, 'unauthenticated'])
  })

  const changes = closed.filter(({ method }) => method !== 'GET')
  it.each(changes.map(route => [nameOf(route), route] as const))('%s changes nothing when another site asks for it with the cookie', async (_name, { method, path }) => {
    const client = await adminClient()
    for (const headers of [{ 'origin': 'https://elsewhere.example' }, { 'origin': origin, 'sec-fetch-site': 'cross-site' }]) {
      const response = await client.fetch(path, { ...body(method), headers })
      expect([response.status, await codeOf(response)]).toEqual([403, 'cross_site_request'])
    }
  })

  let admin: Promise<ApiClient> | undefined
  const adminClient = () => (admin ??= signedIn(origin, 'admin@trotline.example'))
})

describe('every page', () => {
  it.each(pages().filter(({ file }) => !openPages.includes(file)).map(({ file, path }) => [file, path]))('%s leads who is not signed in to the sign-in page and back', async (_file, path) => {
    const client = new ApiClient(origin)
    const first = await client.fetch(path)
    expect(first.status).toBe(302)
    const second = await client.fetch(first.headers.get('location')!)
    expect(second.headers.get('location')).toBe(`/sign-in?${new URLSearchParams({ callbackUrl: path })}`)
  })

  it.each(openPages)('%s is open', async (file) => {
    const page = pages().find(candidate => candidate.file === file)!
    expect((await new ApiClient(origin).fetch(page.path)).status).toBe(200)
  })

  it('knows who is signed in when it is drawn on the server', async () => {
    const client = await signedIn(origin, 'lead@trotline.example')
    const response = await client.fetch('/retrievals')
    expect(response.status).toBe(200)
    expect(await response.text()).toContain('lead@trotline.example')
    expect((await client.fetch('/sign-in')).headers.get('location')).toBe('/')
  })
})

describe('answers to what does not fit', () => {
  const call = (path: string, init: RequestInit = {}) => fetch(`${origin}${path}`, init)

  it('an address that is not there is 404 in our own shape', async () => {
    const response = await call('/api/nothing')
    expect([response.status, await codeOf(response)]).toEqual([404, 'not_found'])
  })

  it('a method that is not taken is 405 and says which are', async () => {
    const response = await call('/api/me', { method: 'PUT' })
    expect([response.status, await codeOf(response), response.headers.get('allow')]).toEqual([405, 'method_not_allowed', 'GET, PATCH'])
  })

  it('a body that is not JSON is 400, one of another type 415, a wrong field 422 with its path', async () => {
    const client = await signedIn(origin, 'observer@trotline.example')
    const send = (contentType: string, text: string) => client.fetch('/api/me/tokens', { method: 'POST', headers: { 'content-type': contentType }, body: text })
    expect((await send('application/json', '{"name":')).status).toBe(400)
    expect((await send('text/plain', '{}')).status).toBe(415)
    const response = await send('application/json', '{"name":"x","scope":"all"}')
    expect(response.status).toBe(422)
    expect(await response.json()).toMatchObject({ error: { code: 'validation_failed', fields: [{ path: 'scope' }] } })
  })

  it('a JSON body over the limit is 413', async () => {
    const client = await signedIn(origin, 'observer@trotline.example')
    const response = await client.fetch('/api/me/tokens', { method: 'POST', json: { name: 'x'.repeat(9 * 1024 * 1024) } })
    expect([response.status, await codeOf(response)]).toEqual([413, 'payload_too_large'])
  })

  it('a page that is not there is an error page without a word of the code', async () => {
    const response = await call('/nowhere', { headers: { accept: 'text/html' } })
    expect(response.status).toBe(404)
    expect(response.headers.get('content-type')).toContain('text/html')
    expect(await response.text()).not.toMatch(/\.mjs|node_modules|stack/)
  })

  it('a set-up link that was made up opens nothing', async () => {
    const response = await new ApiClient(origin).fetch('/api/set-up', { method: 'POST', json: { token: 'x'.repeat(43), email: 'new@trotline.example', name: 'New', password: 'long enough words' } })
    expect([response.status, await codeOf(response)]).toEqual([404, 'not_found'])
  })
})

describe('headers', () => {
  it('each page has a nonce of its own, and every inline script carries it', async () => {
    const read = async () => {
      const response = await fetch(`${origin}/sign-in`)
      const nonce = /'nonce-([^']+)'/.exec(response.headers.get('content-security-policy')!)![1]!
      return { nonce, scripts: (await response.text()).match(/<script[^>]*>/g)! }
    }
    const [first, second] = [await read(), await read()]
    expect(first.nonce).not.toBe(second.nonce)
    expect(first.scripts.length).toBeGreaterThan(2)
    for (const script of first.scripts) expect(script).toContain(`nonce="${first.nonce}"`)
  })

  it('an answer of the API may load nothing and is not kept', async () => {
    const { headers } = await fetch(`${origin}/api/health`)
    expect(headers.get('content-security-policy')).toBe('default-src \'none\'; frame-ancestors \'none\'')
    expect(headers.get('cache-control')).toBe('no-store')
    expect(headers.get('x-content-type-options')).toBe('nosniff')
  })

  it('a request\'s own id is kept, a strange one is replaced', async () => {
    const idOf = async (id: string) => (await fetch(`${origin}/api/health`, { headers: { 'x-request-id': id } })).headers.get('x-request-id')
    expect(await idOf('station-0042')).toBe('station-0042')
    expect(await idOf('a b')).toMatch(/^[0-9A-Z]{26}$/)
  })
})
