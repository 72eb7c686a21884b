import type { Connection } from 'mysql2/promise'
import { ulid } from 'ulid'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { MemberView } from '#shared/schemas/campaign'
import type { LogbookView } from '#shared/schemas/logbook'
import type { Page } from '#shared/types/retrieval'
import { addAccount, rowsOf, type Account } from '../helpers/accounts'
import { mailsTo } from '../helpers/mailbox'
import { database, origin, twoCampaigns, type TwoCampaigns } from '../helpers/shared-service'
import { eventually } from '../helpers/stack'

interface Refusal { error: { code: string, message: string, current?: MemberView } }

let connection: Connection
let at: TwoCampaigns
let base: string

beforeAll(async () => { connection = await database() })
afterAll(() => connection.end())
beforeEach(async () => {
  at = await twoCampaigns(connection, 'members')
  base = `/api/campaigns/${at.slug}`
})

const members = async (by: Account = at.lead) => (await by.call<Page<MemberView>>('GET', `${base}/members`)).body.items
const member = async ({ userId }: Account) => (await members()).find(one => one.userId === userId)
const setRole = (by: Account, whom: Account, role: string, version = 1) => by.call<MemberView & Refusal>('PATCH', `${base}/members/${whom.userId}`, { role, version })
const remove = (by: Account, whom: Account, version = 1) => by.call<Refusal>('DELETE', `${base}/members/${whom.userId}?version=${version}`)
const leave = (by: Account) => by.call<Refusal>('POST', `${base}/leave`)
const campaignId = async () => (await rowsOf<{ id: string }>(connection, 'SELECT id FROM campaigns WHERE slug = ?', [at.slug]))[0]!.id
const addLead = async () => addAccount(connection, origin(), { name: 'second', campaignId: await campaignId(), role: 'lead' })
const lastDeed = async () => (await at.reader.call<Page<LogbookView>>('GET', `/api/logbook?object=campaign:${await campaignId()}`)).body.items.at(-1)
const subjects = async ({ email }: Account) => (await mailsTo(process.env.TROTLINE_TEST_MAILDEV_URL!, email)).map(mail => mail.subject)

describe('a change of role', () => {
  it('is the lead\'s, holds at once, stands in the logbook and is told by mail', async () => {
    const changed = await setRole(at.lead, at.observer, 'analyst')
    expect([changed.status, changed.body]).toMatchObject([200, { role: 'analyst', version: 2, active: true, email: at.observer.email }])
    expect((await at.observer.call('POST', `${base}/stations`, { name: 'Now I may' })).status).toBe(201)
    expect(await lastDeed()).toMatchObject({ action: 'change-role', actor: 'lead', detail: { member: 'observer', from: 'observer', to: 'analyst' } })
    // Whatever the preference says (it is none): this one is not to be missed.
    await eventually(async () => (await subjects(at.observer)).includes(`You are analyst of Test campaign ${at.slug} now`), 'the mail', 20)
  })

  it('refuses a stale version with the member as they stand, and lets one of two through', async () => {
    const answers = await Promise.all(['analyst', 'observer'].map(role => setRole(at.lead, at.reader, role)))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
    const stale = answers.find(answer => answer.status === 409)!
    expect([stale.body.error.code, stale.body.error.current?.version]).toEqual(['stale_version', 2])
  })

  it('is refused to everyone else, for an unknown role and for who is no member', async () => {
    for (const person of [at.analyst, at.observer, at.reader]) {
      expect((await setRole(person, at.observer, 'lead')).body.error.code).toBe('forbidden')
      expect((await remove(person, at.reader)).status).toBe(403)
    }
    expect((await setRole(at.stranger, at.observer, 'lead')).status).toBe(404)
    expect((await setRole(at.lead, at.stranger, 'lead')).status).toBe(404)
    expect((await setRole(at.lead, at.observer, 'owner')).status).toBe(422)
  })

  it('to the role one has changes nothing and sends nothing', async () => {
    expect((await setRole(at.lead, at.reader, 'reader')).body.version).toBe(1)
    expect(await rowsOf(connection, 'SELECT id FROM outbox WHERE user_id = ?', [at.reader.userId])).toEqual([])
  })
})

describe('a removal', () => {
  it('ends the sight of the campaign at once, keeps what was submitted, and is told by mail', async () => {
    const spectrum = await at.observer.call<{ items: { id: string }[] }>('POST', `${base}/spectra`, { name: 'kept', axis: [1514, 1515, 1516], values: [1, 2, 1], axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons' })
    expect((await remove(at.lead, at.observer)).status).toBe(204)
    expect((await at.observer.call('GET', base)).status).toBe(404)
    expect(await member(at.observer)).toBeUndefined()
    expect((await at.reader.call('GET', `/api/spectra/${spectrum.body.items[0]!.id}`)).status).toBe(200)
    expect(await lastDeed()).toMatchObject({ action: 'remove-member', detail: { member: 'observer', role: 'observer' } })
    await eventually(async () => (await subjects(at.observer)).includes(`You are no longer a member of Test campaign ${at.slug}`), 'the mail', 20)
    expect((await remove(at.lead, at.observer)).status).toBe(404)
  })

  it('needs the version that was read', async () => {
    await setRole(at.lead, at.reader, 'analyst')
    expect((await remove(at.lead, at.reader, 1)).body.error.code).toBe('stale_version')
    expect((await at.lead.call('DELETE', `${base}/members/${at.reader.userId}`)).status).toBe(422)
    expect((await remove(at.lead, at.reader, 2)).status).toBe(204)
  })
})

describe('leaving', () => {
  it('is anybody\'s own decision, and is not told by mail to oneself', async () => {
    for (const person of [at.reader, at.observer, at.analyst]) {
      expect((await leave(person)).status).toBe(204)
      expect((await leave(person)).status).toBe(404)
      expect(await rowsOf(connection, 'SELECT id FROM outbox WHERE user_id = ?', [person.userId])).toEqual([])
    }
    expect((await members()).map(one => one.userId)).toEqual([at.lead.userId])
  })
})

describe('the only lead of a campaign', () => {
  it('can neither leave, nor step down, nor be removed, and is told how to hand on', async () => {
    for (const refused of [await leave(at.lead), await setRole(at.lead, at.lead, 'analyst'), await remove(at.lead, at.lead)]) {
      expect([refused.status, refused.body.error.code]).toEqual([409, 'last_lead'])
      expect(refused.body.error.message).toContain('give another member the role lead')
    }
    expect((await member(at.lead))?.role).toBe('lead')
  })

  it('can go once another member leads', async () => {
    expect((await setRole(at.lead, at.analyst, 'lead')).status).toBe(200)
    expect((await leave(at.lead)).status).toBe(204)
    expect((await at.analyst.call<{ role: string }>('GET', base)).body.role).toBe('lead')
    expect((await leave(at.analyst)).body.error.code).toBe('last_lead')
  })

  it('is not helped by another lead whose account is deactivated', async () => {
    const second = await addLead()
    await connection.query('UPDATE users SET deactivated_at = ? WHERE id = ?', [new Date(), second.userId])
    expect((await leave(at.lead)).body.error.code).toBe('last_lead')
    expect((await member(second))?.active).toBe(false)
  })

  it('stays when two leads want to go at the same moment', async () => {
    for (let round = 0; round < 4; round++) {
      at = await twoCampaigns(connection, `both-${ulid().slice(-6).toLowerCase()}`)
      base = `/api/campaigns/${at.slug}`
      const second = await addLead()
      const answers = await Promise.all([leave(at.lead), round % 2 ? leave(second) : setRole(second, second, 'reader')])
      expect(answers.filter(answer => answer.status < 300)).toHaveLength(1)
      expect(answers.filter(answer => answer.body.error?.code === 'last_lead')).toHaveLength(1)
      expect(await rowsOf(connection, 'SELECT m.user_id FROM memberships m JOIN campaigns c ON c.id = m.campaign_id WHERE c.slug = ? AND m.role = \'lead\'', [at.slug])).toHaveLength(1)
    }
  })
})
