import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { nightSpectrum } from '../../docker-free-scripts/demo/night-spectrum.mjs'
import { addAccount, addCampaign, rowsOf, type Account } from '../helpers/accounts'
import { said, settings } from '../helpers/batch-of-spectra'
import { lineTable } from '../helpers/line-tables'
import { mailsTo } from '../helpers/mailbox'
import { database, origin } from '../helpers/shared-service'
import { eventually, sleep } from '../helpers/stack'
import { upload } from '../helpers/upload'

const slug = 'digests'
let connection: Connection
let campaignId: string
let spectrumIds: string[]

beforeAll(async () => {
  connection = await database()
  campaignId = await addCampaign(connection, slug)
  const owner = await addAccount(connection, origin(), { name: 'uploader', campaignId, role: 'observer' })
  const night = (name: string, band: string, seed: number) => ({ name, content: nightSpectrum({ band, medium: 'vacuum', temperature: 190, seed }) as string })
  // The fourth shows another range than the settings' band, so it cannot give a temperature.
  const { items } = await upload(owner, slug, [night('n1.csv', '3-1', 1), night('n2.csv', '3-1', 2), night('n3.csv', '3-1', 3), night('elsewhere.csv', '4-2', 4)], said)
  spectrumIds = items.map(item => item.id!)
})
afterAll(() => connection.end())

const ownerWho = (preference: 'each' | 'digest' | 'none') => addAccount(connection, origin(), { name: preference, preference, campaignId, role: 'observer' })
const mails = ({ email }: Account) => mailsTo(process.env.TROTLINE_TEST_MAILDEV_URL!, email)

async function submitted(owner: Account, body: object): Promise<{ batchId: string, ids: string[] }> {
  const answer = await owner.call<{ batchId: string, ids: string[] }>('POST', `/api/campaigns/${slug}/retrievals`, body)
  expect(answer.status).toBe(202)
  await eventually(async () => (await owner.call<{ done: boolean }>('GET', `/api/batches/${answer.body.batchId}`)).body.done, 'the batch has ended')
  return answer.body
}

/** What has come once nothing more is to be sent. */
async function allMails(owner: Account, atLeast: number) {
  await eventually(async () => (await mails(owner)).length >= atLeast, `${atLeast} mails are in the box`)
  await sleep(5000)
  expect(await rowsOf(connection, 'SELECT id FROM outbox WHERE user_id = ? AND state = \'waiting\'', [owner.userId])).toEqual([])
  return mails(owner)
}

describe('a batch', () => {
  it('is told in one mail to who wants a digest, with its failures by name', async () => {
    const owner = await ownerWho('digest')
    const { batchId } = await submitted(owner, { spectrumIds, settings })
    const [mail, ...more] = await allMails(owner, 1)
    expect(more).toEqual([])
    expect(mail!.subject).toBe('3 of 4 temperatures, 1 failed: Test campaign digests')
    expect(mail!.text).toMatch(/Failed:\n- elsewhere\.csv: \S+/)
    for (const name of ['n1.csv', 'n2.csv', 'n3.csv']) expect(mail!.text).toMatch(new RegExp(`- ${name}: \\d+`))
    expect(mail!.text).toContain(`/batches/${batchId}`)
  })

  it('is told result by result to who wants each', async () => {
    const owner = await ownerWho('each')
    await submitted(owner, { spectrumIds, settings })
    const subjects = (await allMails(owner, 4)).map(mail => mail.subject)
    expect(subjects).toHaveLength(4)
    expect(subjects.filter(subject => subject === 'No temperature: elsewhere.csv')).toHaveLength(1)
    for (const name of ['n1.csv', 'n2.csv', 'n3.csv']) expect(subjects.filter(subject => subject.includes(' K ') && subject.endsWith(`: ${name}`))).toHaveLength(1)
  })

  it('is not told to who wants no mail', async () => {
    const owner = await ownerWho('none')
    await submitted(owner, { spectrumIds, settings })
    expect(await allMails(owner, 0)).toEqual([])
    expect(await rowsOf(connection, 'SELECT id FROM outbox WHERE user_id = ?', [owner.userId])).toEqual([])
  })
})

describe('a single submission of who wants a digest', () => {
  it('is told at once, by one mail', async () => {
    const owner = await ownerWho('digest')
    await submitted(owner, { lineTable: lineTable(187.4, 'alone') })
    const found = await allMails(owner, 1)
    expect(found).toHaveLength(1)
    expect(found[0]!.subject).toMatch(/^187\.\d+ K ± [\d.]+: alone$/)
  })
})

describe('a batch that somebody else aborts', () => {
  it('is told to its owner with what was aborted and by whom', async () => {
    const owner = await ownerWho('digest')
    const analyst = await addAccount(connection, origin(), { name: 'analyst', campaignId, role: 'analyst' })
    const { body: { ids } } = await owner.call<{ ids: string[] }>('POST', `/api/campaigns/${slug}/retrievals`, { spectrumIds: spectrumIds.slice(0, 2), settings, hold: true })
    const answers = await Promise.all(ids.map(id => analyst.call('POST', `/api/retrievals/${id}/abort`)))
    expect(answers.map(({ status }) => status)).toEqual([202, 202])
    // The digest may be due between the two aborts; the second then has its own mail.
    const text = (await allMails(owner, 1)).map(mail => mail.text).join('\n')
    for (const name of ['n1.csv', 'n2.csv']) expect(text).toContain(name)
    expect(text).toContain('Aborted by analyst.')
  })
})
