import type { Connection } from 'mysql2/promise'
import { ulid } from 'ulid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CampaignView, MemberView } from '#shared/schemas/campaign'
import type { InvitationOffer, InvitationOutcome, InvitationView } from '#shared/schemas/invitation'
import type { Page } from '#shared/types/retrieval'
import { addAccount, rowsOf, type Account } from '../helpers/accounts'
import { ApiClient, signedIn } from '../helpers/api-client'
import { mailsTo, type ReceivedMail } from '../helpers/mailbox'
import { database, origin, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { eventually } from '../helpers/stack'

interface Refusal { error: { code: string, message: string, fields?: { path: string }[], current?: InvitationView } }

const password = 'a sentence that is long enough'
let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => {
  connection = await database()
  at = await twoCampaigns(connection, 'invitations')
  base = `/api/campaigns/${at.slug}`
})
afterAll(() => connection.end())

const newAddress = () => `guest-${ulid().toLowerCase()}@elsewhere.example`
const visitor = () => new ApiClient(origin())
const post = async <T>(client: ApiClient, path: string, json: unknown): Promise<{ status: number, body: T }> => {
  const response = await client.fetch(path, { method: 'POST', json })
  return { status: response.status, body: await response.json() as T }
}
const look = (token: string) => post<InvitationOffer & Refusal>(visitor(), '/api/invitations/look', { token })
const accept = (token: string, name = 'Guest') => post<InvitationOutcome & Refusal>(visitor(), '/api/invitations/accept', { token, name, password })
const join = (client: ApiClient, token: string) => post<InvitationOutcome & Refusal>(client, '/api/invitations/join', { token })

const invite = async (email: string, role = 'observer', by: Account = at.lead) => {
  const answer = await by.call<InvitationView>('POST', `${base}/invitations`, { email, role })
  expect(answer.status).toBe(201)
  return answer.body
}
const inbox = (address: string) => mailsTo(process.env.TROTLINE_TEST_MAILDEV_URL!, address)
const mailNumber = (address: string, count: number): Promise<ReceivedMail> => eventually(async () => (await inbox(address))[count - 1], `mail ${count} to ${address}`, 20)
const tokenIn = ({ text }: ReceivedMail): string => /\/invitations\/([\w-]{43})/.exec(text)![1]!
const invitedToken = async (email: string, role?: string) => {
  await invite(email, role)
  return tokenIn(await mailNumber(email, 1))
}
const roleOf = async (email: string): Promise<string | undefined> =>
  (await at.reader.call<Page<MemberView>>('GET', `${base}/members?limit=500`)).body.items.find(member => member.email === email)?.role

/** An account that has a password, as only people who sign in have. */
async function personWithPassword(name: string): Promise<{ email: string, client: ApiClient }> {
  const { email } = await addAccount(connection, origin(), { name })
  await connection.query('UPDATE users u, users d SET u.password_hash = d.password_hash WHERE u.email = ? AND d.email = ?', [email, 'reader@trotline.example'])
  return { email, client: await signedIn(origin(), email) }
}

describe('an invitation to a campaign', () => {
  it('goes out by mail, in text and markup, with who invites whom to what and how long it holds', async () => {
    const email = newAddress()
    const view = await invite(email, 'analyst')
    expect(view).toMatchObject({ email, role: 'analyst', state: 'waiting', invitedBy: 'lead', round: 1, acceptedAt: null })
    expect((Date.parse(view.expiresAt) - Date.now()) / 86_400_000).toBeCloseTo(7, 2)
    const mail = await mailNumber(email, 1)
    expect(mail.subject).toBe(`lead invites you to Test campaign ${at.slug}`)
    for (const words of ['as analyst', view.expiresAt.slice(0, 10), `${origin()}/invitations/`]) {
      expect(mail.text).toContain(words)
      expect(mail.html).toContain(words)
    }
    // Nobody chose to get it, so there is nothing to switch off.
    expect(mail.headers['list-unsubscribe']).toBeUndefined()
  })

  it('leaves no link in the database: neither in its row, nor in the outbox, nor in the logbook', async () => {
    const email = newAddress()
    const token = await invitedToken(email)
    const [row] = await rowsOf<Record<string, unknown>>(connection, 'SELECT * FROM invitations WHERE email = ?', [email])
    const mails = await rowsOf<Record<string, unknown>>(connection, 'SELECT * FROM outbox WHERE address = ?', [email])
    const deeds = await rowsOf<Record<string, unknown>>(connection, 'SELECT * FROM logbook WHERE detail LIKE ?', [`%${email}%`])
    expect([mails.length, deeds.length]).toEqual([1, 1])
    expect(JSON.stringify([row, mails, deeds])).not.toContain(token)
    expect(row!.token_hash).toMatch(/^[0-9a-f]{64}$/)
  })

  it('lets a new person in with a name and a password, once, and they can sign in and see the campaign', async () => {
    const email = newAddress()
    const token = await invitedToken(email, 'analyst')
    expect((await look(token)).body).toMatchObject({ email, hasAccount: false, campaign: `Test campaign ${at.slug}`, role: 'analyst', asAdministrator: false, invitedBy: 'lead' })
    const short = await post<Refusal>(visitor(), '/api/invitations/accept', { token, name: ' ', password: 'short' })
    expect([short.status, short.body.error.fields?.map(field => field.path)]).toEqual([422, ['name', 'password']])
    const answers = await Promise.all([1, 2, 3].map(() => accept(token)))
    expect(answers.map(answer => answer.status).sort()[0]).toBe(201)
    expect(answers.filter(answer => answer.status === 201)).toHaveLength(1)
    expect(answers.map(answer => answer.status).every(status => [201, 404, 409].includes(status))).toBe(true)
    const client = await signedIn(origin(), email, password)
    expect(await (await client.fetch(base)).json()).toMatchObject({ slug: at.slug, role: 'analyst' })
    expect(await (await client.fetch('/api/me')).json()).toMatchObject({ email, name: 'Guest', isAdministrator: false })
    const [stored] = await rowsOf<{ hash: string }>(connection, 'SELECT password_hash AS hash FROM users WHERE email = ?', [email])
    expect(stored!.hash).toMatch(/^\$argon2id\$/)
    expect((await accept(token)).body.error.message).toContain('has been used')
    expect((await look(token)).status).toBe(404)
  })

  it('lets somebody with an account join after signing in with the invited address, and nobody else', async () => {
    const person = await personWithPassword('account')
    const other = await personWithPassword('other')
    const token = await invitedToken(person.email)
    expect((await look(token)).body.hasAccount).toBe(true)
    const asNew = await accept(token)
    expect([asNew.status, asNew.body.error.code]).toEqual([409, 'conflict'])
    const wrong = await join(other.client, token)
    expect([wrong.status, wrong.body.error.message]).toEqual([403, expect.stringContaining(person.email)])
    expect(await roleOf(other.email)).toBeUndefined()
    expect((await join(visitor(), token)).status).toBe(401)
    const joined = await join(person.client, token)
    expect([joined.status, joined.body]).toEqual([200, { email: person.email, campaign: at.slug, role: 'observer' }])
    expect(await roleOf(person.email)).toBe('observer')
    expect((await join(person.client, token)).status).toBe(404)
  })

  it('is answered alike whether the address has an account or not', async () => {
    const withAccount = await addAccount(connection, origin(), { name: 'known' })
    const answers = await Promise.all([withAccount.email, newAddress()].map(email => at.lead.call<InvitationView>('POST', `${base}/invitations`, { email, role: 'reader' })))
    const shapes = answers.map(({ status, body }) => ({ status, body: { ...body, id: '', email: '', createdAt: '', sentAt: '', expiresAt: '' } }))
    expect(shapes[0]).toEqual(shapes[1])
    const mails = await Promise.all(answers.map(({ body }) => mailNumber(body.email, 1)))
    const worded = mails.map(mail => mail.text.replace(/\/invitations\/\S+/, '').replace(/until .*/, ''))
    expect(worded[0]).toBe(worded[1])
  })

  it('is refused twice for one address, for a member, for what is no address, and to everyone but the lead', async () => {
    const email = newAddress()
    await invite(email)
    const twice = await at.lead.call<Refusal>('POST', `${base}/invitations`, { email: ` ${email.toUpperCase()} `, role: 'reader' })
    expect([twice.status, twice.body.error.code, twice.body.error.fields?.[0]?.path]).toEqual([409, 'conflict', 'email'])
    const member = await at.lead.call<Refusal>('POST', `${base}/invitations`, { email: at.reader.email, role: 'lead' })
    expect([member.status, member.body.error.message]).toEqual([409, expect.stringContaining('is a member')])
    expect((await at.lead.call('POST', `${base}/invitations`, { email: 'nobody', role: 'reader' })).status).toBe(422)
    expect((await at.lead.call('POST', `${base}/invitations`, { email: newAddress(), role: 'owner' })).status).toBe(422)
    for (const person of [at.analyst, at.observer, at.reader]) {
      expect((await person.call('POST', `${base}/invitations`, { email: newAddress(), role: 'reader' })).status).toBe(403)
      expect((await person.call('GET', `${base}/invitations`)).status).toBe(403)
    }
    expect((await at.stranger.call('GET', `${base}/invitations`)).status).toBe(404)
  })

  it('sends one mail when two leads invite the same address at the same moment', async () => {
    const email = newAddress()
    const answers = await Promise.all([1, 2, 3, 4].map(() => at.lead.call('POST', `${base}/invitations`, { email, role: 'reader' })))
    expect(answers.map(answer => answer.status).sort()).toEqual([201, 409, 409, 409])
    await mailNumber(email, 1)
    expect(await rowsOf(connection, 'SELECT id FROM outbox WHERE address = ?', [email])).toHaveLength(1)
  })
})

describe('an invitation that waits', () => {
  it('is sent again with a new link; the old link opens nothing any more', async () => {
    const email = newAddress()
    const old = await invitedToken(email)
    const [view] = (await at.lead.call<Page<InvitationView>>('GET', `${base}/invitations?limit=1`)).body.items
    const again = await at.lead.call<InvitationView>('POST', `${base}/invitations/${view!.id}/resend`, { round: 1 })
    expect([again.status, again.body.round, again.body.state]).toEqual([200, 2, 'waiting'])
    const stale = await at.lead.call<Refusal>('POST', `${base}/invitations/${view!.id}/resend`, { round: 1 })
    expect([stale.status, stale.body.error.code, stale.body.error.current?.round]).toEqual([409, 'stale_version', 2])
    const fresh = tokenIn(await mailNumber(email, 2))
    expect(fresh).not.toBe(old)
    expect((await look(old)).body.error.message).toContain('newer one')
    expect((await accept(old)).status).toBe(404)
    expect((await accept(fresh)).status).toBe(201)
  })

  it('ends after seven days, says so, and lives again when it is sent again', async () => {
    const email = newAddress()
    const token = await invitedToken(email)
    await connection.query('UPDATE invitations SET expires_at = ? WHERE email = ?', [new Date(Date.now() - 1000), email])
    const late = await accept(token)
    expect([late.status, late.body.error.message]).toEqual([404, expect.stringContaining('Ask lead to send it again')])
    const listed = (await at.lead.call<Page<InvitationView>>('GET', `${base}/invitations`)).body.items.find(item => item.email === email)!
    expect(listed.state).toBe('expired')
    const again = await at.lead.call<InvitationView>('POST', `${base}/invitations/${listed.id}/resend`, { round: 1 })
    expect(again.body.state).toBe('waiting')
    expect((await look(tokenIn(await mailNumber(email, 2)))).status).toBe(200)
  })

  it('can be withdrawn; its link says so, and the address can be invited anew', async () => {
    const email = newAddress()
    const token = await invitedToken(email)
    const listed = (await at.lead.call<Page<InvitationView>>('GET', `${base}/invitations`)).body.items.find(item => item.email === email)!
    expect((await at.lead.call('DELETE', `${base}/invitations/${listed.id}`)).status).toBe(204)
    expect((await look(token)).body.error.message).toContain('withdrawn')
    expect((await accept(token)).status).toBe(404)
    expect((await at.lead.call<Refusal>('DELETE', `${base}/invitations/${listed.id}`)).body.error.code).toBe('already_finished')
    expect((await at.lead.call<Refusal>('POST', `${base}/invitations/${listed.id}/resend`, { round: 1 })).body.error.code).toBe('already_finished')
    await invite(email)
  })

  it('is not found by the lead of another campaign or through the service', async () => {
    const { id } = await invite(newAddress())
    for (const path of [`/api/campaigns/${at.otherSlug}/invitations/${id}`, `${base}/invitations/${id}`]) expect((await at.stranger.call('DELETE', path)).status).toBe(404)
    const admin = await signedIn(origin(), 'admin@trotline.example')
    expect((await admin.fetch(`/api/admin/invitations/${id}`, { method: 'DELETE' })).status).toBe(404)
  })

  it('is kept out by a deactivated account', async () => {
    const person = await addAccount(connection, origin(), { name: 'gone' })
    await connection.query('UPDATE users SET deactivated_at = ? WHERE id = ?', [new Date(), person.userId])
    const token = await invitedToken(person.email)
    for (const answer of [await look(token), await accept(token)]) expect([answer.status, answer.body.error.message]).toEqual([409, expect.stringContaining('deactivated')])
  })

  it('does not lower the role of somebody who became a member meanwhile', async () => {
    const person = await personWithPassword('meanwhile')
    const token = await invitedToken(person.email, 'reader')
    await connection.query('INSERT INTO memberships (campaign_id, user_id, role, created_at) SELECT c.id, u.id, ?, ? FROM campaigns c, users u WHERE c.slug = ? AND u.email = ?', ['analyst', new Date(), at.slug, person.email])
    expect((await join(person.client, token)).body).toMatchObject({ role: 'analyst' })
    expect(await roleOf(person.email)).toBe('analyst')
  })
})

describe('an invitation to the service', () => {
  const admin = () => signedIn(origin(), 'admin@trotline.example')

  it('is for administrators to send, makes an account that begins campaigns of its own, and an administrator where it says so', async () => {
    const [plain, high] = [newAddress(), newAddress()]
    const client = await admin()
    expect((await post<InvitationView>(client, '/api/admin/invitations', { email: plain })).body).toMatchObject({ email: plain, role: null, asAdministrator: false })
    expect((await post(client, '/api/admin/invitations', { email: high, asAdministrator: true })).status).toBe(201)
    expect((await at.lead.call('POST', '/api/admin/invitations', { email: newAddress() })).status).toBe(403)
    for (const email of [plain, high]) expect((await accept(tokenIn(await mailNumber(email, 1)))).body).toMatchObject({ email, campaign: null, role: null })
    const people = await Promise.all([plain, high].map(email => signedIn(origin(), email, password)))
    const own = await post<CampaignView>(people[0]!, '/api/campaigns', { title: `Guest's ${plain}` })
    expect([own.status, own.body.role]).toEqual([201, 'lead'])
    expect((await people[0]!.fetch('/api/admin/accounts')).status).toBe(403)
    expect((await people[1]!.fetch('/api/admin/accounts')).status).toBe(200)
    await connection.query('UPDATE users SET is_administrator = 0 WHERE email = ?', [high])
  })

  it('makes an administrator of somebody who has an account already', async () => {
    const person = await personWithPassword('raised')
    await post(await admin(), '/api/admin/invitations', { email: person.email, asAdministrator: true })
    expect((await join(person.client, tokenIn(await mailNumber(person.email, 1)))).status).toBe(200)
    expect(await (await person.client.fetch('/api/me')).json()).toMatchObject({ isAdministrator: true })
    await connection.query('UPDATE users SET is_administrator = 0 WHERE email = ?', [person.email])
  })
})
