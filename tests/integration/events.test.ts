import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { connect, rowsOf } from '../helpers/accounts'
import { signedIn } from '../helpers/api-client'
import { settings, uploadSpectra, type SpectraAtHand } from '../helpers/batch-of-spectra'
import { openStream, readStream, type OpenStream } from '../helpers/event-stream'
import { createStack, destroyStack, emptyRedis, eventually, seed, sleep, startWeb, startWorker, stop, stopWorkers, type Stack } from '../helpers/stack'

let stack: Stack
let connection: Connection
let at: SpectraAtHand

beforeAll(async () => {
  stack = await createStack('events')
  await startWeb(stack)
  await seed(stack, 'accounts')
  connection = await connect(stack.databaseUrl)
  at = await uploadSpectra(connection, stack.origin, 'followed', 5)
})
afterAll(async () => {
  await connection.end()
  await destroyStack(stack)
})

interface Batch { batchId: string, ids: string[], path: string }

/** Queued, and nobody works on it until a worker is started. */
async function waitingBatch(count = 5): Promise<Batch> {
  await stopWorkers(stack)
  const { body } = await at.owner.call<{ batchId: string, ids: string[] }>('POST', `/api/campaigns/${at.slug}/retrievals`, { spectrumIds: at.spectrumIds.slice(0, count), settings })
  return { ...body, path: `/api/batches/${body.batchId}/events` }
}

const follow = (path: string, headers?: Record<string, string>) => openStream(`${stack.origin}${path}`, at.owner.token, headers)
const heard = (stream: OpenStream, count: number) => eventually(async () => stream.events.length >= count, `${count} events are heard`, 20)
const phasesOf = ({ events }: OpenStream, id: string) => events.filter(({ data }) => data.retrievalId === id).map(({ data }) => data.phase)
const numbers = ({ events }: OpenStream) => events.filter(({ event }) => event !== 'done').map(({ id }) => Number(id))
const whenEnded = async (stream: OpenStream, seconds: number) => {
  const begun = Date.now()
  expect(await Promise.race([stream.ended.then(() => 'ended'), sleep(seconds * 1000).then(() => 'still open')])).toBe('ended')
  return (Date.now() - begun) / 1000
}

describe('the stream of a batch', () => {
  it('tells every phase of every retrieval as it comes, then that all is done', async () => {
    const { path, ids } = await waitingBatch()
    const stream = await follow(path)
    await heard(stream, 5)
    expect(stream.events.every(({ data }) => data.phase === 'QUEUED')).toBe(true)
    await startWorker(stack)
    await whenEnded(stream, 30)
    for (const id of ids) expect(phasesOf(stream, id)).toEqual(['QUEUED', 'EXECUTING', 'COMPLETED'])
    expect(numbers(stream)).toEqual([...numbers(stream)].sort((a, b) => a - b))
    expect(stream.events.at(-1)).toMatchObject({ event: 'done', data: { done: true, byPhase: { COMPLETED: 5 } } })
  })

  it('comes to its end after Redis was emptied', async () => {
    const { path, ids } = await waitingBatch()
    const stream = await follow(path)
    await emptyRedis(stack)
    await startWorker(stack)
    await whenEnded(stream, 60)
    for (const id of ids) expect(phasesOf(stream, id)).toEqual(['QUEUED', 'EXECUTING', 'COMPLETED'])
  })

  it('goes on after the last event heard, without a gap and without a repetition', async () => {
    const { path, batchId } = await waitingBatch()
    const first = await follow(path)
    await heard(first, 5)
    first.close()
    await startWorker(stack)
    await eventually(async () => (await rowsOf(connection, 'SELECT id FROM retrievals WHERE batch_id = ? AND phase = \'COMPLETED\'', [batchId])).length === 5, 'all are done')
    const second = await follow(path, { 'last-event-id': first.events.at(-1)!.id })
    await whenEnded(second, 10)
    const stored = await rowsOf<{ id: number }>(connection, 'SELECT id FROM retrieval_events WHERE batch_id = ? ORDER BY id', [batchId])
    expect([...numbers(first), ...numbers(second)]).toEqual(stored.map(({ id }) => id))
    expect((await follow(path, { 'last-event-id': second.events.at(-1)!.id })).status).toBe(204)
  })
})

describe('events whose transactions end in another order', () => {
  const insert = (db: Connection, { batchId, ids }: Batch, progress: number) => db.query(
    'INSERT INTO retrieval_events (retrieval_id, batch_id, kind, revision, phase, progress, at) VALUES (?, ?, \'progress\', 1, \'QUEUED\', ?, utc_timestamp(3))', [ids[0], batchId, progress])

  it('are told in the order of their ids, to who is there and to who comes back', async () => {
    const batch = await waitingBatch(1)
    const slow = await connect(stack.databaseUrl)
    const stream = await follow(batch.path)
    await heard(stream, 1)
    await slow.beginTransaction()
    await insert(slow, batch, 0.25)
    await insert(connection, batch, 0.5)
    await sleep(900)
    expect(stream.events, 'the younger one waits for the older').toHaveLength(1)
    const back = await follow(batch.path, { 'last-event-id': stream.events[0]!.id })
    await slow.commit()
    await heard(stream, 3)
    await heard(back, 2)
    expect(numbers(stream)).toEqual([...numbers(stream)].sort((a, b) => a - b))
    expect(numbers(back)).toEqual(numbers(stream).slice(1))
    stream.close()
    back.close()
    await slow.end()
  })

  it('do not wait for one that was rolled back', async () => {
    const batch = await waitingBatch(1)
    const slow = await connect(stack.databaseUrl)
    const stream = await follow(batch.path)
    await heard(stream, 1)
    await slow.beginTransaction()
    await insert(slow, batch, 0.25)
    await insert(connection, batch, 0.5)
    await slow.rollback()
    await heard(stream, 2)
    stream.close()
    await slow.end()
  })
})

describe('an open stream', () => {
  it('shows that it is alive while nothing happens', async () => {
    const { path } = await waitingBatch(1)
    const stream = await follow(path)
    await eventually(async () => stream.comments.length > 0, 'a heartbeat is heard', 20)
    stream.close()
  })

  it('ends within seconds once its sign-in has ended', async () => {
    const { path } = await waitingBatch(1)
    await connection.query('INSERT INTO memberships (campaign_id, user_id, role, created_at) SELECT c.id, u.id, \'observer\', utc_timestamp(3) FROM campaigns c, users u WHERE c.slug = ? AND u.email = \'observer@trotline.example\'', [at.slug])
    const client = await signedIn(stack.origin, 'observer@trotline.example')
    const stream = await readStream(await client.fetch(path), () => undefined)
    await heard(stream, 1)
    await client.signOut()
    expect(await whenEnded(stream, 10)).toBeLessThan(6)
  })

  it('ends within seconds once its reader has left the campaign', async () => {
    const { path } = await waitingBatch(1)
    const stream = await follow(path)
    await heard(stream, 1)
    await connection.query('DELETE FROM memberships WHERE user_id = ?', [at.owner.userId])
    expect(await whenEnded(stream, 10)).toBeLessThan(6)
    await connection.query('INSERT INTO memberships (campaign_id, user_id, role, created_at) SELECT id, ?, \'observer\', utc_timestamp(3) FROM campaigns WHERE slug = ?', [at.owner.userId, at.slug])
  })

  it('holds up no shutdown', async () => {
    const { path } = await waitingBatch(1)
    const streams = await Promise.all(Array.from({ length: 3 }, () => follow(path)))
    const begun = Date.now()
    await stop(stack.web!)
    expect((Date.now() - begun) / 1000).toBeLessThan(5)
    await Promise.all(streams.map(stream => whenEnded(stream, 1)))
    await startWeb(stack)
    const again = await follow(path)
    await heard(again, 1)
    again.close()
  })
})
