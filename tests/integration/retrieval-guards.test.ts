import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { closeDatabase, connectDatabase } from '../../server/database/client'
import { finishExecution } from '../../server/database/retrievals/finish'
import { addAccount, addCampaign, connect, rowsOf, type Account } from '../helpers/accounts'
import { fineSpectrum, said, settings, wideSettings, wideSpectrum } from '../helpers/batch-of-spectra'
import { lineTable } from '../helpers/line-tables'
import { mailsTo } from '../helpers/mailbox'
import { createStack, destroyStack, eventually, killService, sleep, startServices, startWeb, startWorker, stopWorkers, type Stack } from '../helpers/stack'

interface Detail { phase: string, reason: string | null, temperature: number | null }

const fitSeconds = 12
let stack: Stack
let connection: Connection
let observer: Account, analyst: Account

beforeAll(async () => {
  stack = await createStack('guards', { TROTLINE_FIT_SECONDS: String(fitSeconds) })
  await startWeb(stack)
  connection = await connect(stack.databaseUrl)
  const campaignId = await addCampaign(connection, 'guards')
  observer = await addAccount(connection, stack.origin, { name: 'observer', campaignId, role: 'observer', preference: 'each' })
  analyst = await addAccount(connection, stack.origin, { name: 'analyst', campaignId, role: 'analyst' })
})
afterAll(async () => {
  await connection.end()
  await destroyStack(stack)
})

async function submit(body: object): Promise<string> {
  const answer = await observer.call<{ ids: [string] }>('POST', '/api/campaigns/guards/retrievals', body)
  expect(answer.status, JSON.stringify(answer.body)).toBe(202)
  return answer.body.ids[0]
}
const submitTable = (temperature: number, name: string) => submit({ lineTable: lineTable(temperature, name) })

/** A retrieval whose fit takes long enough to be met while it runs. */
const submitFine = (seed: number) => submitSpectrum(fineSpectrum(500_000, seed), `fine-${seed}.csv`, settings)
/** A retrieval whose fit takes longer than it may. */
const submitWide = (pixels: number) => submitSpectrum(wideSpectrum(pixels), `wide-${pixels}.csv`, wideSettings)

async function submitSpectrum(text: string, name: string, terms: object): Promise<string> {
  const form = new FormData()
  form.append('about', JSON.stringify(said))
  form.append('files', new Blob([text]), name)
  const response = await fetch(`${stack.origin}/api/campaigns/guards/spectra`, { method: 'POST', headers: { authorization: `Bearer ${observer.token}` }, body: form })
  const { items: [item] } = await response.json() as { items: [{ ok: boolean, id: string }] }
  expect(item).toMatchObject({ ok: true, missing: [] })
  return submit({ spectrumIds: [item.id], settings: terms })
}

const detail = async (id: string) => (await observer.call<Detail>('GET', `/api/retrievals/${id}`)).body
const reaches = (id: string, phase: string, seconds = 60) => eventually(async () => {
  const row = await detail(id)
  return row.phase === phase && row
}, `${id} is ${phase}`, seconds)
const isExecuting = async (id: string) => {
  for (const end = Date.now() + 30_000; Date.now() < end; await sleep(5)) {
    const [row] = await rowsOf<{ phase: string }>(connection, 'SELECT phase FROM retrievals WHERE id = ?', [id])
    if (row!.phase !== 'QUEUED') return expect(row!.phase).toBe('EXECUTING')
  }
  throw new Error(`${id} was never executed`)
}
const resultsOf = (id: string) => rowsOf<{ attempt: number, phase: string }>(connection, 'SELECT attempt, phase FROM retrieval_results WHERE retrieval_id = ?', [id])
const outboxOf = async (subjectKey: string) => (await rowsOf<{ state: string, attempts: number, message_id: string, last_error: string | null }>(connection, 'SELECT state, attempts, message_id, last_error FROM outbox WHERE subject_key = ?', [subjectKey]))[0]

describe('a result', () => {
  it('is stored by the newest attempt; one that comes late changes nothing', async () => {
    const late = await startWorker(stack)
    const id = await submitFine(11)
    await isExecuting(id)
    late.kill('SIGSTOP')
    await startWorker(stack)
    await reaches(id, 'COMPLETED', 90)
    const [before] = await rowsOf(connection, 'SELECT * FROM retrieval_results WHERE retrieval_id = ?', [id])
    const [row] = await rowsOf<{ attempt: number }>(connection, 'SELECT attempt FROM retrievals WHERE id = ?', [id])
    expect(row!.attempt).toBeGreaterThan(1)
    late.kill('SIGCONT')
    // The late one ends its fit and takes further work: two at once, so that both workers are asked.
    const more = await Promise.all(Array.from({ length: 12 }, (_, i) => submitTable(150 + i, `after ${i}`)))
    await Promise.all(more.map(one => reaches(one, 'COMPLETED')))
    await sleep(5000)
    expect(await rowsOf(connection, 'SELECT * FROM retrieval_results WHERE retrieval_id = ?', [id])).toEqual([before])
    expect(await resultsOf(id)).toEqual([{ attempt: row!.attempt, phase: 'COMPLETED' }])
    expect(await rowsOf(connection, 'SELECT id FROM retrieval_events WHERE retrieval_id = ? AND phase = \'COMPLETED\'', [id])).toHaveLength(1)
    await stopWorkers(stack)
  })

  it('is there once for a revision, whoever writes', async () => {
    await startWorker(stack)
    const id = await submitTable(170, 'once')
    await reaches(id, 'COMPLETED')
    await expect(connection.query('INSERT INTO retrieval_results SELECT retrieval_id, revision, attempt + 1, phase, settings, result, provenance, reason, note, created_by, created_at FROM retrieval_results WHERE retrieval_id = ?', [id]))
      .rejects.toMatchObject({ code: 'ER_DUP_ENTRY' })
  })
})

describe('the end of an execution', () => {
  it('is granted to the attempt that holds it, once, and to an abort that was asked for before any result', async () => {
    await stopWorkers(stack)
    const id = await submitTable(171, 'held')
    const db = connectDatabase(stack.databaseUrl)
    const end = (attempt: number, phase: 'COMPLETED' | 'ABORTED', revision = 1) => finishExecution(db, { id, revision, attempt, phase, columns: {} })
    const hold = (abort: boolean) => connection.query('UPDATE retrievals SET phase = \'EXECUTING\', attempt = 2, heartbeat_at = utc_timestamp(3), abort_requested = ? WHERE id = ?', [abort, id])
    await hold(false)
    expect([await end(1, 'COMPLETED'), await end(3, 'COMPLETED'), await end(2, 'COMPLETED', 2), await end(1, 'ABORTED')]).toEqual([false, false, false, false])
    expect([await end(2, 'COMPLETED'), await end(2, 'COMPLETED')]).toEqual([true, false])
    await hold(true)
    expect([await end(2, 'COMPLETED'), await end(2, 'ABORTED'), await end(2, 'ABORTED')]).toEqual([false, true, false])
    await closeDatabase()
    await startWorker(stack)
  })
})

describe('an abort', () => {
  it('of a fit that runs ends it without a result, and is no news to who asked for it', async () => {
    const id = await submitFine(12)
    await isExecuting(id)
    expect((await observer.call('POST', `/api/retrievals/${id}/abort`)).body).toEqual({ id, phase: 'EXECUTING' })
    expect(await reaches(id, 'ABORTED')).toMatchObject({ reason: 'Aborted by observer.', temperature: null })
    expect((await resultsOf(id)).map(({ phase }) => phase)).toEqual(['ABORTED'])
    expect(await outboxOf(`abort:${id}:1`)).toBeUndefined()
  })

  it('by somebody else, of what runs and of what waits, is told to the owner with the name', async () => {
    const running = await submitFine(13)
    await isExecuting(running)
    const draft = await submit({ lineTable: lineTable(150, 'a draft'), hold: true })
    for (const id of [running, draft]) expect((await analyst.call('POST', `/api/retrievals/${id}/abort`)).status).toBe(202)
    await Promise.all([reaches(running, 'ABORTED'), reaches(draft, 'ABORTED')])
    const mails = await eventually(async () => {
      const found = (await mailsTo(stack.maildevUrl, observer.email)).filter(mail => mail.subject.startsWith('Aborted'))
      return found.length === 2 && found
    }, 'both mails are in the box')
    expect(mails.map(mail => mail.subject).sort()).toEqual(['Aborted: a draft', 'Aborted: fine-13.csv'])
    for (const { text } of mails) expect(text).toContain('Aborted by analyst.')
  })
})

describe('a fit that takes too long', () => {
  it('ends at once when it is aborted', async () => {
    const id = await submitWide(100_001)
    await isExecuting(id)
    await sleep(2000)
    expect((await detail(id)).phase).toBe('EXECUTING')
    expect((await observer.call('POST', `/api/retrievals/${id}/abort`)).status).toBe(202)
    await reaches(id, 'ABORTED', 2)
  })

  it('ends at its limit with the reason in words, is heard of all the while, and leaves the worker well', async () => {
    const id = await submitWide(100_000)
    await isExecuting(id)
    const ages: number[] = []
    const ended = await eventually(async () => {
      const [row] = await rowsOf<{ phase: string, age: number }>(connection, 'SELECT phase, TIMESTAMPDIFF(MICROSECOND, heartbeat_at, UTC_TIMESTAMP(3)) / 1e6 AS age FROM retrievals WHERE id = ?', [id])
      if (row!.phase === 'EXECUTING') ages.push(Number(row!.age))
      return row!.phase !== 'EXECUTING' && detail(id)
    }, 'it ends', fitSeconds + 5)
    expect(ended).toMatchObject({ phase: 'ERROR', reason: expect.stringContaining(`longer than the ${fitSeconds} s`) })
    expect(ages.length).toBeGreaterThan(20)
    expect(Math.max(...ages)).toBeLessThan(4)
    expect(await resultsOf(id)).toEqual([{ attempt: 1, phase: 'ERROR' }])
    await reaches(await submitTable(180, 'after the long one'), 'COMPLETED', 10)
  })
})

describe('without its mail server', () => {
  it('keeps a mail, tries again, and sends it once under the Message-ID that it had', async () => {
    killService(stack, 'maildev')
    const id = await submitTable(188, 'mail later')
    await reaches(id, 'COMPLETED')
    const waiting = await eventually(async () => {
      const mail = await outboxOf(`result:${id}:1`)
      return mail && mail.attempts >= 2 && mail
    }, 'it was tried twice')
    expect([waiting.state, Boolean(waiting.last_error)]).toEqual(['waiting', true])
    await startServices(stack)
    const found = async () => (await mailsTo(stack.maildevUrl, observer.email)).filter(mail => mail.subject.includes('mail later'))
    await eventually(async () => (await found()).length > 0, 'the mail is in the box')
    await sleep(5000)
    expect((await found()).map(mail => mail.headers['message-id'])).toEqual([waiting.message_id])
    expect(await outboxOf(`result:${id}:1`)).toMatchObject({ state: 'sent', message_id: waiting.message_id })
  })

  it('doubles no mail with two workers at the outbox', async () => {
    await startWorker(stack)
    const ids = await Promise.all(Array.from({ length: 20 }, (_, i) => submitTable(200 + i, `two workers ${i}`)))
    await Promise.all(ids.map(id => reaches(id, 'COMPLETED')))
    const found = async () => (await mailsTo(stack.maildevUrl, observer.email)).filter(mail => mail.subject.includes('two workers'))
    await eventually(async () => (await found()).length >= ids.length, 'all mails are in the box')
    await sleep(3000)
    const mails = await found()
    expect([mails.length, new Set(mails.map(mail => mail.headers['message-id'])).size]).toEqual([20, 20])
  })
})

describe('without Redis', () => {
  it('takes submissions without delay and does them once Redis is back', async () => {
    killService(stack, 'redis')
    await eventually(async () => (await (await fetch(`${stack.origin}/api/ready`)).text()).includes('degraded'), 'the service says that it is degraded')
    const begun = Date.now()
    const ids = [await submitTable(210, 'no queue'), await submitTable(211, 'no queue either')]
    expect(Date.now() - begun).toBeLessThan(4000)
    await sleep(2000)
    expect((await Promise.all(ids.map(detail))).map(({ phase }) => phase)).toEqual(['QUEUED', 'QUEUED'])
    await startServices(stack)
    await Promise.all(ids.map(id => reaches(id, 'COMPLETED')))
    for (const id of ids) expect(await resultsOf(id)).toHaveLength(1)
  })
})
