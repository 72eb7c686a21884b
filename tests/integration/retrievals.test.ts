import type { Connection } from 'mysql2/promise'
import { ulid } from 'ulid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { addAccount, addCampaign, connect, rowsOf, type Account } from '../helpers/accounts'
import { settings } from '../helpers/batch-of-spectra'
import { lineTable } from '../helpers/line-tables'
import { createStack, destroyStack, eventually, startWeb, startWorker, stop, type Stack } from '../helpers/stack'

interface Answer { batchId: string, ids: string[], error: { code: string, fields?: { path: string }[] } }
interface Detail { phase: string, revision: number, temperature: number | null, reason: string | null, result: { temperature: { value: number } } | null, revisions: unknown[], verdict: string | null }

let stack: Stack
let connection: Connection
let observer: Account, analyst: Account, reader: Account, stranger: Account

const submit = (body: object, headers = {}, who = observer) => who.call<Answer>('POST', '/api/campaigns/rows/retrievals', body, headers)
const detail = async (id: string) => (await observer.call<Detail>('GET', `/api/retrievals/${id}`)).body
const reaches = (id: string, phase: string) => eventually(async () => {
  const row = await detail(id)
  return row.phase === phase && row
}, `${id} is ${phase}`, 30)
const stopWorkers = async () => {
  for (const worker of stack.workers.splice(0)) await stop(worker)
}

describe('retrievals over HTTP, with real services', () => {
  beforeAll(async () => {
    stack = await createStack('rows', { TROTLINE_FIT_SECONDS: '20' })
    await startWeb(stack)
    await startWorker(stack)
    connection = await connect(stack.databaseUrl)
    const campaignId = await addCampaign(connection, 'rows')
    const account = (name: string, role?: 'observer' | 'analyst' | 'reader') => addAccount(connection, stack.origin, { name, ...(role ? { campaignId, role } : {}), preference: name === 'observer' ? 'each' : 'none' })
    observer = await account('observer', 'observer')
    analyst = await account('analyst', 'analyst')
    reader = await account('reader', 'reader')
    stranger = await account('stranger')
  })
  afterAll(async () => {
    await connection.end()
    await destroyStack(stack)
  })

  it('turns a line table into the temperature that it was made with', async () => {
    const { status, body } = await submit({ lineTable: lineTable(187.4) })
    expect(status).toBe(202)
    const done = await reaches(body.ids[0]!, 'COMPLETED')
    expect(done.temperature).toBeCloseTo(187.4, 6)
    expect(done.result?.temperature.value).toBe(done.temperature)
  })

  it('answers the same to the same Idempotency-Key and refuses another body under it', async () => {
    const headers = { 'idempotency-key': ulid() }
    const body = { lineTable: lineTable(150, 'once') }
    const answers = await Promise.all([submit(body, headers), submit(body, headers)])
    expect(answers.map(answer => answer.status)).toEqual([202, 202])
    expect(answers[0]!.body).toEqual(answers[1]!.body)
    expect(await rowsOf(connection, 'SELECT id FROM retrievals WHERE name = \'once\'')).toHaveLength(1)
    const other = await submit({ lineTable: lineTable(151, 'once') }, headers)
    expect([other.status, other.body.error.code]).toEqual([409, 'idempotency_mismatch'])
  })

  it('refuses an unknown label with its place in the table', async () => {
    const { status, body } = await submit({ lineTable: { observable: 'photon-emission', lineList: 'oh-meinel', band: '3-1', lines: [{ label: 'P1(2)', intensity: 5, sigma: 1 }, { label: 'P1(77)', intensity: 4, sigma: 1 }] } })
    expect(status).toBe(422)
    expect(body.error.fields?.[0]?.path).toBe('lineTable.lines.1.label')
  })

  it('wants exactly one of spectra and line table', async () => {
    expect((await submit({})).status).toBe(422)
    expect((await submit({ lineTable: lineTable(100), spectrumIds: [ulid()] })).status).toBe(422)
  })

  it('lets a reader look but not submit, and hides rows from strangers', async () => {
    const { body: { ids: [id], batchId } } = await submit({ lineTable: lineTable(200) })
    expect((await submit({ lineTable: lineTable(200) }, {}, reader)).status).toBe(403)
    expect((await reader.call('GET', `/api/retrievals/${id}`)).status).toBe(200)
    for (const path of [`/api/retrievals/${id}`, `/api/retrievals/${id}/events`, `/api/retrievals/${id}/picture`, `/api/batches/${batchId}`, `/api/batches/${batchId}/events`]) {
      expect((await stranger.call('GET', path)).status, path).toBe(404)
    }
    for (const verb of ['abort', 'submit']) expect((await stranger.call('POST', `/api/retrievals/${id}/${verb}`)).status).toBe(404)
    expect((await stranger.call<{ total: number }>('GET', '/api/retrievals?campaign=rows')).body.total).toBe(0)
  })

  it('holds a spectrum from a script that does not say its medium, and queues it once that is said', async () => {
    const axis = Array.from({ length: 400 }, (_, i) => 1520 + 0.05 * i)
    const about = { axisUnit: 'nm', valueKind: 'photons' }
    const upload = await observer.call<{ items: { id: string, missing: string[] }[] }>('POST', '/api/campaigns/rows/spectra', { name: 'unsaid', axis, values: axis.map(() => 1), ...about })
    const [{ id: spectrumId, missing }] = upload.body.items as [{ id: string, missing: string[] }]
    expect(missing).toEqual(['medium'])
    const { body: { ids: [id] } } = await submit({ spectrumIds: [spectrumId], settings })
    expect((await detail(id!)).phase).toBe('HELD')
    expect((await observer.call<Answer>('POST', `/api/retrievals/${id}/submit`)).body.error.code).toBe('incomplete_spectrum')
    expect((await observer.call('POST', `/api/retrievals/${id}/abort`)).status).toBe(202)
    expect((await detail(id!)).phase).toBe('ABORTED')
  })

  it('keeps drafts until they are submitted', async () => {
    const { body: { ids: [id] } } = await submit({ lineTable: lineTable(123), hold: true })
    expect((await detail(id!)).phase).toBe('PENDING')
    expect((await observer.call('POST', `/api/retrievals/${id}/submit`)).status).toBe(202)
    expect((await reaches(id!, 'COMPLETED')).temperature).toBeCloseTo(123, 6)
    expect((await observer.call<Answer>('POST', `/api/retrievals/${id}/submit`)).body.error.code).toBe('wrong_phase')
  })

  it('shows the old result while a revision waits, then the new one', async () => {
    const { body: { ids: [id] } } = await submit({ lineTable: lineTable(170) })
    await reaches(id!, 'COMPLETED')
    await stopWorkers()
    const revised = await observer.call<{ revision: number }>('POST', `/api/retrievals/${id}/revise`, { settings: { temperatureRange: [100, 400] }, note: 'narrower' })
    expect([revised.status, revised.body.revision]).toEqual([202, 2])
    const waiting = await detail(id!)
    expect([waiting.phase, waiting.revision]).toEqual(['QUEUED', 2])
    expect(waiting.result?.temperature.value).toBeCloseTo(170, 6)
    await startWorker(stack)
    expect((await reaches(id!, 'COMPLETED')).revisions).toHaveLength(2)
  })

  it('has results reviewed by a second person only', async () => {
    const mine = await analyst.call<Answer>('POST', '/api/campaigns/rows/retrievals', { lineTable: lineTable(180) })
    const { body: { ids: [theirs] } } = await submit({ lineTable: lineTable(180) })
    await Promise.all([reaches(mine.body.ids[0]!, 'COMPLETED'), reaches(theirs!, 'COMPLETED')])
    const accept = (who: Account, id: string) => who.call('POST', `/api/retrievals/${id}/review`, { verdict: 'accept' })
    expect((await accept(observer, theirs!)).status).toBe(403)
    expect((await accept(analyst, mine.body.ids[0]!)).status).toBe(403)
    expect((await accept(analyst, theirs!)).status).toBe(200)
    expect((await detail(theirs!)).verdict).toBe('accept')
  })

  it('aborts what waits, what runs and what is drafted, and says that a finished one is finished', async () => {
    await stopWorkers()
    const { body: { ids: [waiting] } } = await submit({ lineTable: lineTable(160) })
    const { body: { ids: [draft] } } = await submit({ lineTable: lineTable(160), hold: true })
    const { body: { ids: [running] } } = await submit({ lineTable: lineTable(160) })
    for (const id of [waiting, draft]) {
      expect((await observer.call('POST', `/api/retrievals/${id}/abort`)).status).toBe(202)
      expect((await detail(id!)).phase).toBe('ABORTED')
      expect((await observer.call<Answer>('POST', `/api/retrievals/${id}/abort`)).body.error.code).toBe('already_finished')
    }
    // An execution whose process is gone: the next holder finds the word that was left.
    await connection.query('UPDATE retrievals SET phase = \'EXECUTING\', attempt = 1, heartbeat_at = utc_timestamp(3) - interval 1 minute WHERE id = ?', [running])
    expect((await observer.call('POST', `/api/retrievals/${running}/abort`)).status).toBe(202)
    expect((await detail(running!)).phase).toBe('EXECUTING')
    await startWorker(stack)
    await reaches(running!, 'ABORTED')
    expect(await rowsOf(connection, 'SELECT phase FROM retrieval_results WHERE retrieval_id = ?', [running])).toEqual([{ phase: 'ABORTED' }])
  })

  it('replays events after the last one heard and closes with done', async () => {
    const { body: { batchId, ids: [id] } } = await submit({ lineTable: lineTable(140) })
    await reaches(id!, 'COMPLETED')
    const all = String((await observer.call('GET', `/api/batches/${batchId}/events`)).body)
    expect([...all.matchAll(/"phase":"(\w+)"/g)].map(match => match[1])).toEqual(['QUEUED', 'EXECUTING', 'COMPLETED'])
    const ids = [...all.matchAll(/^id: (\d+)$/gm)].map(match => match[1]!)
    const rest = String((await observer.call('GET', `/api/retrievals/${id}/events`, undefined, { 'last-event-id': ids[1]! })).body)
    expect([...rest.matchAll(/^id: (\d+)$/gm)].map(match => match[1])).toEqual(ids.slice(2))
    expect(rest).toContain('event: done')
    const again = await observer.call('GET', `/api/retrievals/${id}/events`, undefined, { 'last-event-id': `${ids[2]}.done` })
    expect(again.status).toBe(204)
  })

  it('walks a sorted list page by page without losing or repeating a row', async () => {
    const seen: string[] = []
    let cursor = ''
    let total = 0
    do {
      const { body } = await observer.call<{ items: { id: string, temperature: number | null }[], nextCursor: string | null, total: number }>('GET', `/api/retrievals?campaign=rows&sort=-temperature&limit=3&cursor=${cursor}`)
      seen.push(...body.items.map(item => item.id))
      cursor = body.nextCursor ?? ''
      total = body.total
    } while (cursor)
    expect(seen).toHaveLength(total)
    expect(new Set(seen).size).toBe(total)
  })

  it('exports the digits that the mail carries', async () => {
    const { body: { ids: [id] } } = await submit({ lineTable: lineTable(191.37, 'same digits') })
    await reaches(id!, 'COMPLETED')
    const csv = String((await observer.call('GET', '/api/exports/retrievals?campaign=rows&q=same%20digits')).body)
    const [header, row] = csv.trim().split('\r\n').map(line => line.split(',')) as [string[], string[]]
    const printed = row[header.indexOf('temperature_printed')]
    expect(Number(row[header.indexOf('temperature_K')])).toBeCloseTo(191.37, 6)
    const mail = await eventually(async () => {
      const mails = await (await fetch(`${stack.maildevUrl}/api/email`)).json() as { subject: string, text: string }[]
      return mails.find(one => one.subject.includes('same digits'))
    }, 'the mail is in the box')
    expect(mail.subject).toContain(`${printed} K`)
    expect(mail.text).toContain(`/retrievals/${id}`)
  })
})
