import type { Call } from './accounts'

/** A browser as far as our server can tell: keeps cookies, sends its Origin, follows no redirect by itself. */
export class ApiClient {
  private readonly cookies = new Map<string, string>()

  constructor(readonly origin: string) {}

  async fetch(path: string, { json, ...init }: RequestInit & { json?: unknown } = {}): Promise<Response> {
    const headers = new Headers(init.headers)
    if (this.cookies.size) headers.set('cookie', this.cookieHeader())
    if (!headers.has('origin') && init.method && init.method !== 'GET') headers.set('origin', this.origin)
    if (json !== undefined) headers.set('content-type', 'application/json')
    const response = await fetch(new URL(path, this.origin), { redirect: 'manual', ...init, headers, body: json === undefined ? init.body : JSON.stringify(json) })
    for (const cookie of response.headers.getSetCookie()) this.keep(cookie)
    return response
  }

  /** Signs in as the page does. The answer is the server's, whether it let us in or not. */
  async signIn(email: string, password: string): Promise<Response> {
    return this.sendForm('/api/auth/callback/credentials', { email, password })
  }

  signOut = (): Promise<Response> => this.sendForm('/api/auth/signout', {})

  cookieHeader = (): string => [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ')

  /** Another browser with the same cookies: a copied cookie jar. */
  copy(): ApiClient {
    const twin = new ApiClient(this.origin)
    for (const [name, value] of this.cookies) twin.cookies.set(name, value)
    return twin
  }

  private async sendForm(path: string, fields: Record<string, string>): Promise<Response> {
    const { csrfToken } = await (await this.fetch('/api/auth/csrf')).json() as { csrfToken: string }
    return this.fetch(path, { method: 'POST', body: new URLSearchParams({ ...fields, csrfToken, callbackUrl: this.origin, json: 'true' }) })
  }

  private keep(cookie: string): void {
    const [pair = '', ...attributes] = cookie.split(';').map(part => part.trim())
    const [name = '', ...value] = pair.split('=')
    const isOver = attributes.some(attribute => /^max-age=0$/i.test(attribute)) || value.join('=') === ''
    if (isOver) this.cookies.delete(name)
    else this.cookies.set(name, value.join('='))
  }
}

/** Calls of somebody who sits at a page: with the cookie, answering as a call with a token does. */
export const callOnPage = (client: ApiClient): Call => async <T>(method: string, path: string, body?: unknown, headers: Record<string, string> = {}) => {
  const response = await client.fetch(path, { method, headers, ...(body === undefined ? {} : { json: body }) })
  const text = await response.text()
  return { status: response.status, body: (response.headers.get('content-type')?.includes('json') ? JSON.parse(text) : text) as T }
}

export const demoPassword = 'trotline-demo'

/** Signed in as one of the demo accounts, or whoever has this address and password. */
export async function signedIn(origin: string, email: string, password = demoPassword): Promise<ApiClient> {
  const client = new ApiClient(origin)
  const response = await client.signIn(email, password)
  if (!response.ok) throw new Error(`Could not sign in as ${email}: ${response.status} ${await response.text()}`)
  return client
}
