import { rmSync } from 'node:fs'
import type { Connection } from 'mysql2/promise'
import { ulid } from 'ulid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { AccountDetail, ManagedAccount, ManagedMail, Overview, QueueView, RetryAnswer, StorageView } from '#shared/schemas/admin'
import { engineVersion } from '#shared/engine/version'
import type { Page, RetrievalDetail } from '#shared/types/retrieval'
import { addAccount, addCampaign, rowsOf, type Account, type Call } from '../helpers/accounts'
import { settings, uploadSpectra } from '../helpers/batch-of-spectra'
import { callOnPage, demoPassword, signedIn } from '../helpers/api-client'
import { lineTable } from '../helpers/line-tables'
import { mailsTo } from '../helpers/mailbox'
import { database, origin } from '../helpers/shared-service'
import { eventually, sleep } from '../helpers/stack'
import manifest from '../../package.json'

interface Refusal { error: { code: string, message: string, fields?: { path: string }[], current?: AccountDetail } }

let connection: Connection
let admin: Call

beforeAll(async () => {
  connection = await database()
  admin = callOnPage(await signedIn(origin(), 'admin@trotline.example'))
})
afterAll(() => connection.end())

/** At a page, with the password that the demo accounts have: what administrators do is not done with a token. */
async function atAPage({ userId, email }: Account): Promise<Call> {
  await connection.query('UPDATE users u, users d SET u.password_hash = d.password_hash WHERE u.id = ? AND d.email = ?', [userId, 'admin@trotline.example'])
  return callOnPage(await signedIn(origin(), email, demoPassword))
}

const unique = () => ulid().slice(-8).toLowerCase()
const account = async (id: string) => (await admin<AccountDetail>('GET', `/api/admin/accounts/${id}`)).body
const change = async (id: string, wanted: object) => admin<AccountDetail & Refusal>('PATCH', `/api/admin/accounts/${id}`, { version: (await account(id)).version, ...wanted })
const subjects = async (email: string) => (await mailsTo(process.env.TROTLINE_TEST_MAILDEV_URL!, email)).map(mail => mail.subject)
const gotMail = (email: string, subject: string) => eventually(async () => (await subjects(email)).includes(subject), `mail "${subject}"`, 20)

describe('accounts', () => {
  it('are listed with the newest first, found by name or address, and paged', async () => {
    const mark = `zz${unique()}`
    const made: Account[] = []
    for (let i = 0; i < 3; i++) made.push(await addAccount(connection, origin(), { name: `${mark}-${i}` }))
    const first = (await admin<Page<ManagedAccount>>('GET', `/api/admin/accounts?q=${mark}&limit=2`)).body
    expect([first.total, first.items.map(item => item.name)]).toEqual([3, [`${mark}-2`, `${mark}-1`]])
    const second = (await admin<Page<ManagedAccount>>('GET', `/api/admin/accounts?q=${mark}&limit=2&cursor=${first.nextCursor}`)).body
    expect([second.nextCursor, second.items.map(item => item.email)]).toEqual([null, [made[0]!.email]])
    expect((await admin<Page<ManagedAccount>>('GET', `/api/admin/accounts?q=${encodeURIComponent('%')}`)).body.total).toBe(0)
    expect((await admin<Page<ManagedAccount>>('GET', '/api/admin/accounts?state=administrator&limit=500')).body.items.map(item => item.email)).toContain('admin@trotline.example')
  })

  it('say when they were last seen, on a page or by a token, and in how many campaigns they are', async () => {
    const campaignId = await addCampaign(connection, `seen-${unique()}`)
    const person = await addAccount(connection, origin(), { name: 'seen', campaignId, role: 'reader' })
    expect(await account(person.userId)).toMatchObject({ lastSeenAt: null, campaigns: 1, active: true, isAdministrator: false })
    const before = Date.now()
    await person.call('GET', '/api/me')
    const seen = await eventually(async () => (await account(person.userId)).lastSeenAt, 'the use of the token is noted', 5)
    expect(Math.abs(Date.parse(seen) - before)).toBeLessThan(5000)
  })

  it('are deactivated: signed out, tokens refused, told by mail; and reactivated', async () => {
    const person = await addAccount(connection, origin(), { name: 'leaving' })
    await connection.query('UPDATE users u, users d SET u.password_hash = d.password_hash WHERE u.id = ? AND d.email = ?', [person.userId, 'reader@trotline.example'])
    const browser = await signedIn(origin(), person.email)
    const gone = await change(person.userId, { active: false })
    expect([gone.status, gone.body.active]).toEqual([200, false])
    expect((await browser.fetch('/api/me')).status).toBe(401)
    expect((await person.call('GET', '/api/me')).status).toBe(401)
    await expect(signedIn(origin(), person.email)).rejects.toThrow('401')
    await gotMail(person.email, 'Your account is deactivated')
    expect((await change(person.userId, { active: true })).body).toMatchObject({ active: true, deactivatedAt: null })
    expect((await person.call('GET', '/api/me')).status).toBe(200)
    // A sign-in from before stays ended.
    expect((await browser.fetch('/api/me')).status).toBe(401)
    await gotMail(person.email, 'Your account is active again')
    const log = await rowsOf<{ action: string }>(connection, 'SELECT action FROM logbook WHERE object_kind = \'account\' AND object_id = ? ORDER BY id', [person.userId])
    expect(log.map(row => row.action)).toEqual(['deactivated', 'reactivated'])
  })

  it('become administrators and cease to be, with a mail each time; a stale version is refused', async () => {
    const person = await addAccount(connection, origin(), { name: 'raised' })
    const page = await atAPage(person)
    expect((await change(person.userId, { isAdministrator: true })).body.isAdministrator).toBe(true)
    expect((await page('GET', '/api/admin/overview')).status).toBe(200)
    const stale = await admin<Refusal>('PATCH', `/api/admin/accounts/${person.userId}`, { version: 1, isAdministrator: false })
    expect([stale.status, stale.body.error.code, stale.body.error.current?.version]).toEqual([409, 'stale_version', 2])
    expect((await change(person.userId, { isAdministrator: false })).status).toBe(200)
    expect((await page('GET', '/api/admin/overview')).status).toBe(403)
    await gotMail(person.email, 'You are an administrator now')
    await gotMail(person.email, 'You are no longer an administrator')
  })

  it('always keep one administrator, also when two go at the same moment', async () => {
    const others = (await rowsOf<{ id: string, email: string }>(connection, 'SELECT id, email FROM users WHERE is_administrator AND email <> ?', ['admin@trotline.example'])).map(row => row.id)
    if (others.length) await connection.query('UPDATE users SET is_administrator = 0 WHERE id IN (?)', [others])
    const [own] = await rowsOf<{ id: string }>(connection, 'SELECT id FROM users WHERE email = ?', ['admin@trotline.example'])
    for (const wanted of [{ active: false }, { isAdministrator: false }]) {
      const refused = await change(own!.id, wanted)
      expect([refused.status, refused.body.error.code, refused.body.error.message]).toEqual([409, 'last_administrator', expect.stringContaining('Make another account an administrator first')])
    }
    const second = await addAccount(connection, origin(), { name: 'second' })
    const atSecond = await atAPage(second)
    await change(second.userId, { isAdministrator: true })
    const [versionOfOwn, versionOfSecond] = [(await account(own!.id)).version, (await account(second.userId)).version]
    const answers = await Promise.all([
      atSecond<Refusal>('PATCH', `/api/admin/accounts/${own!.id}`, { version: versionOfOwn, isAdministrator: false }),
      admin<Refusal>('PATCH', `/api/admin/accounts/${second.userId}`, { version: versionOfSecond, isAdministrator: false }),
    ])
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
    await connection.query('UPDATE users SET is_administrator = (email = ?) WHERE id IN (?)', ['admin@trotline.example', [own!.id, second.userId]])
    if (others.length) await connection.query('UPDATE users SET is_administrator = 1 WHERE id IN (?)', [others])
  })

  it('leave no campaign without a lead: the only lead goes when a member takes over, who is told', async () => {
    const slug = `alone-${unique()}`
    const campaignId = await addCampaign(connection, slug)
    const lead = await addAccount(connection, origin(), { name: 'only', campaignId, role: 'lead' })
    const heir = await addAccount(connection, origin(), { name: 'heir', campaignId, role: 'observer' })
    const stranger = await addAccount(connection, origin(), { name: 'stranger' })
    expect((await account(lead.userId)).leadsAlone).toMatchObject([{ campaign: slug, members: [{ userId: heir.userId, role: 'observer' }] }])
    const refused = await change(lead.userId, { active: false })
    expect([refused.status, refused.body.error.code, refused.body.error.fields?.[0]?.path]).toEqual([409, 'last_lead', `successors.${slug}`])
    const outside = await change(lead.userId, { active: false, successors: [{ campaign: slug, userId: stranger.userId }] })
    expect([outside.status, outside.body.error.fields?.[0]?.path]).toEqual([422, `successors.${slug}`])
    expect((await account(lead.userId)).active).toBe(true)
    expect((await change(lead.userId, { active: false, successors: [{ campaign: slug, userId: heir.userId }] })).body).toMatchObject({ active: false, leadsAlone: [] })
    expect((await heir.call<{ role: string }>('GET', `/api/campaigns/${slug}`)).body.role).toBe('lead')
    await gotMail(heir.email, `You lead Test campaign ${slug} now`)
    const [deed] = await rowsOf<{ detail: string }>(connection, 'SELECT detail FROM logbook WHERE action = \'appoint-lead\' AND object_id = ?', [campaignId])
    expect(JSON.parse(deed!.detail)).toMatchObject({ member: 'heir', instead: 'only' })
  })
})

describe('the queue', () => {
  async function oneRetrieval(name: string, body: (slug: string) => Promise<object> | object = () => ({ lineTable: lineTable(180, name) })) {
    const slug = `${name}-${unique()}`
    const campaignId = await addCampaign(connection, slug)
    const owner = await addAccount(connection, origin(), { name, campaignId, role: 'observer' })
    const { body: answer } = await owner.call<{ ids: string[] }>('POST', `/api/campaigns/${slug}/retrievals`, await body(slug))
    return { owner, slug, campaignId, id: answer.ids[0]! }
  }
  const detail = async (owner: Account, id: string) => (await owner.call<RetrievalDetail>('GET', `/api/retrievals/${id}`)).body
  const ended = (owner: Account, id: string, revision: number) => eventually(async () => {
    const now = await detail(owner, id)
    return now.revision === revision && ['COMPLETED', 'ERROR'].includes(now.phase) && now
  }, `revision ${revision} has ended`, 40)
  const troubled = async (id: string) => (await admin<QueueView>('GET', '/api/admin/queue')).body.troubled.items.find(item => item.id === id)
  const retry = async (...ids: string[]) => (await admin<RetryAnswer>('POST', '/api/admin/queue/retry', { ids })).body.items

  it('counts by phase, and knows from BullMQ that one worker is there', async () => {
    const { owner, id } = await oneRetrieval('counted')
    await ended(owner, id, 1)
    const view = (await admin<QueueView>('GET', '/api/admin/queue')).body
    expect(view.queue).toMatchObject({ workers: 1, jobs: { failed: 0 } })
    const [{ n }] = await rowsOf<{ n: number }>(connection, 'SELECT COUNT(*) AS n FROM retrievals WHERE phase = \'COMPLETED\'') as [{ n: number }]
    expect(view.byPhase.COMPLETED).toBe(n)
  })

  it('shows what failed because the stored bytes were gone, without its name, and fits it again when they are back', async () => {
    const spectra = await uploadSpectra(connection, origin(), `lost-${unique()}`, 1)
    const [row] = await rowsOf<{ campaignId: string, sha: string }>(connection, 'SELECT campaign_id AS campaignId, sha256 AS sha FROM spectra WHERE id = ?', [spectra.spectrumIds[0]])
    const file = `${process.env.TROTLINE_TEST_STORAGE_DIR}/${row!.campaignId}/${row!.sha.slice(0, 2)}/${row!.sha}`
    const { copyFileSync } = await import('node:fs')
    copyFileSync(file, `${file}.away`)
    rmSync(file)
    const { body } = await spectra.owner.call<{ ids: string[] }>('POST', `/api/campaigns/${spectra.slug}/retrievals`, { spectrumIds: spectra.spectrumIds, settings })
    const id = body.ids[0]!
    expect((await ended(spectra.owner, id, 1)).phase).toBe('ERROR')
    const shown = await troubled(id)
    expect(shown).toMatchObject({ trouble: 'fault', phase: 'ERROR', attempts: 1, reason: expect.stringContaining('not there') })
    expect(JSON.stringify(shown)).not.toContain(`${spectra.slug}-0.csv`)
    copyFileSync(`${file}.away`, file)
    expect(await retry(id)).toEqual([{ id, ok: true }])
    expect((await ended(spectra.owner, id, 2)).phase).toBe('COMPLETED')
    expect(await troubled(id)).toBeUndefined()
    const results = await rowsOf<{ phase: string }>(connection, 'SELECT phase FROM retrieval_results WHERE retrieval_id = ? ORDER BY revision', [id])
    expect(results.map(result => result.phase)).toEqual(['ERROR', 'COMPLETED'])
  })

  it('does not fit again what failed through its own input, nor what is done', async () => {
    const done = await oneRetrieval('done')
    await ended(done.owner, done.id, 1)
    const spectra = await uploadSpectra(connection, origin(), `own-${unique()}`, 1)
    const { body } = await spectra.owner.call<{ ids: string[] }>('POST', `/api/campaigns/${spectra.slug}/retrievals`, { spectrumIds: spectra.spectrumIds, settings: { ...settings, bands: ['4-2'] } })
    expect((await ended(spectra.owner, body.ids[0]!, 1)).phase).toBe('ERROR')
    const items = await retry(done.id, body.ids[0]!, ulid())
    expect(items.map(item => [item.ok, item.message])).toEqual([[false, expect.stringContaining('COMPLETED')], [false, expect.stringContaining('its own input')], [false, expect.stringContaining('no such')]])
  })

  it('takes an execution that runs for far too long from whoever holds it, and fits it anew', async () => {
    const { owner, id } = await oneRetrieval('overlong', () => ({ lineTable: lineTable(180, 'overlong'), hold: true }))
    // A holder that beats and never ends, as a hanging process would.
    await connection.query('UPDATE retrievals SET phase = \'EXECUTING\', attempt = 7, started_at = utc_timestamp(3) - INTERVAL 2 HOUR, queued_at = utc_timestamp(3), heartbeat_at = utc_timestamp(3) + INTERVAL 1 HOUR WHERE id = ?', [id])
    expect(await troubled(id)).toMatchObject({ trouble: 'overlong', attempts: 7 })
    expect(await retry(id)).toEqual([{ id, ok: true }])
    const now = await ended(owner, id, 1)
    expect(now.phase).toBe('COMPLETED')
    const [row] = await rowsOf<{ attempt: number, before: number }>(connection, 'SELECT attempt, attempts_before AS `before` FROM retrievals WHERE id = ?', [id])
    expect([row!.attempt, row!.before]).toEqual([9, 8])
  })

  it('leaves an execution alone that gives signs of life', async () => {
    const { id } = await oneRetrieval('lively', () => ({ lineTable: lineTable(180, 'lively'), hold: true }))
    await connection.query('UPDATE retrievals SET phase = \'EXECUTING\', attempt = 1, started_at = utc_timestamp(3), heartbeat_at = utc_timestamp(3) + INTERVAL 1 HOUR WHERE id = ?', [id])
    expect(await troubled(id)).toBeUndefined()
    expect(await retry(id)).toEqual([{ id, ok: false, message: expect.stringContaining('signs of life') }])
    await connection.query('UPDATE retrievals SET phase = \'ABORTED\' WHERE id = ?', [id])
  })

  it('gives a set-aside retrieval all its attempts again with the next revision', async () => {
    const { owner, id } = await oneRetrieval('dying', () => ({ lineTable: lineTable(180, 'dying'), hold: true }))
    await connection.query('UPDATE retrievals SET attempt = 20 WHERE id = ?', [id])
    await owner.call('POST', `/api/retrievals/${id}/submit`)
    const aside = await ended(owner, id, 1)
    expect([aside.phase, aside.reason]).toEqual(['ERROR', expect.stringContaining('set aside')])
    expect(await retry(id)).toEqual([{ id, ok: true }])
    expect((await ended(owner, id, 2)).phase).toBe('COMPLETED')
  })
})

describe('the outbox', () => {
  it('shows a mail that was given up with its last error, and sends it when told to', async () => {
    const person = await addAccount(connection, origin(), { name: 'unlucky' })
    await change(person.userId, { isAdministrator: true })
    await gotMail(person.email, 'You are an administrator now')
    const id = (await rowsOf<{ id: string }>(connection, 'SELECT id FROM outbox WHERE address = ?', [person.email]))[0]!.id
    const again = () => admin<ManagedMail & Refusal>('POST', `/api/admin/mails/${id}/resend`)
    expect((await again()).body.error.code).toBe('already_finished')
    await connection.query('UPDATE outbox SET state = \'failed\', attempts = 30, sent_at = NULL, last_error = \'connect ECONNREFUSED\' WHERE id = ?', [id])
    const failed = (await admin<Page<ManagedMail>>('GET', '/api/admin/mails?state=failed')).body.items.find(mail => mail.id === id)
    expect(failed).toMatchObject({ to: person.email, kind: 'standing', attempts: 30, lastError: 'connect ECONNREFUSED' })
    expect((await again()).body).toMatchObject({ state: 'waiting', attempts: 0 })
    await eventually(async () => (await subjects(person.email)).filter(subject => subject === 'You are an administrator now').length === 2, 'it was sent again', 20)
    expect((await admin('POST', `/api/admin/mails/${ulid()}/resend`)).status).toBe(404)
    await change(person.userId, { isAdministrator: false })
  })
})

describe('storage and versions', () => {
  it('count the bytes and files of each campaign and tell the free space', async () => {
    const spectra = await uploadSpectra(connection, origin(), `bytes-${unique()}`, 3)
    const use = (await admin<StorageView>('GET', '/api/admin/storage')).body
    const own = use.campaigns.find(({ slug }) => slug === spectra.slug)!
    const [sum] = await rowsOf<{ bytes: number }>(connection, 'SELECT SUM(byte_count) AS bytes FROM spectra s JOIN campaigns c ON c.id = s.campaign_id WHERE c.slug = ?', [spectra.slug])
    expect(own).toMatchObject({ files: 3, bytes: Number(sum!.bytes), archived: false })
    expect(use.bytes).toBe(use.campaigns.reduce((total, campaign) => total + campaign.bytes, 0))
    expect(use.space!.free).toBeGreaterThan(0)
    expect(use.space!.free).toBeLessThan(use.space!.total)
  })

  it('name what runs', async () => {
    const { versions, workers } = (await admin<Overview>('GET', '/api/admin/overview')).body
    const [schema] = await rowsOf<{ name: string }>(connection, 'SELECT MAX(name) AS name FROM schema_migrations')
    expect(versions).toEqual({ app: manifest.version, engine: engineVersion, schema: schema!.name, node: process.versions.node, database: expect.stringContaining('MariaDB'), redis: expect.stringMatching(/^\d+\./) })
    expect(workers).toBe(1)
  })
})

it('an administrator sees nothing of a campaign through any of it', async () => {
  const slug = `private-${unique()}`
  const spectra = await uploadSpectra(connection, origin(), slug, 1)
  await spectra.owner.call('POST', `/api/campaigns/${slug}/retrievals`, { spectrumIds: spectra.spectrumIds, settings, note: 'a private remark' })
  await sleep(200)
  const answers = await Promise.all(['overview', 'accounts', 'queue', 'mails?state=sent', 'mails', 'storage', 'invitations'].map(path => admin('GET', `/api/admin/${path}`)))
  const text = JSON.stringify(answers)
  for (const content of [`${slug}-0.csv`, 'a private remark']) expect(text).not.toContain(content)
  for (const path of [`/api/campaigns/${slug}`, `/api/campaigns/${slug}/members`, `/api/spectra/${spectra.spectrumIds[0]}`]) expect((await admin('GET', path)).status).toBe(404)
})
