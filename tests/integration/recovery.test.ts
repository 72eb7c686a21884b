import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { connect, rowsOf } from '../helpers/accounts'
import { settings, uploadSpectra, type SpectraAtHand } from '../helpers/batch-of-spectra'
import { createStack, destroyStack, emptyRedis, eventually, killDatabase, sleep, startServices, startWeb, startWorker, stop, type Stack } from '../helpers/stack'

const size = 200
/** The harm is done while at least this many have ended and more are to come. */
const midway = 40

let stack: Stack

const counts = async (connection: Connection, batchId: string) => {
  const rows = await rowsOf<{ phase: string, n: number }>(connection, 'SELECT phase, COUNT(*) AS n FROM retrievals WHERE batch_id = ? GROUP BY phase', [batchId])
  return Object.fromEntries(rows.map(row => [row.phase, row.n])) as Record<string, number>
}

/** Queues the batch with one worker at work and waits until it is in the middle. */
async function queueAndReachTheMiddle({ owner, slug, spectrumIds }: SpectraAtHand): Promise<string> {
  const { status, body } = await owner.call<{ batchId: string }>('POST', `/api/campaigns/${slug}/retrievals`, { spectrumIds, settings })
  expect(status).toBe(202)
  const connection = await connect(stack.databaseUrl)
  for (;;) {
    const { COMPLETED = 0, ERROR = 0 } = await counts(connection, body.batchId)
    if (COMPLETED + ERROR >= midway) {
      expect(COMPLETED + ERROR, 'the batch was not over before the harm was done').toBeLessThan(size)
      await connection.end()
      return body.batchId
    }
    await sleep(20)
  }
}

async function expectEveryResultOnce(batchId: string, owner: string): Promise<void> {
  const connection = await connect(stack.databaseUrl)
  await eventually(async () => {
    const { QUEUED = 0, EXECUTING = 0 } = await counts(connection, batchId)
    return QUEUED + EXECUTING === 0
  }, 'no row is stuck after two minutes', 120)
  expect(await counts(connection, batchId)).toEqual({ COMPLETED: size })
  const [results] = await rowsOf<{ n: number, distinctRows: number }>(connection, 'SELECT COUNT(*) AS n, COUNT(DISTINCT r.retrieval_id) AS distinctRows FROM retrieval_results r JOIN retrievals t ON t.id = r.retrieval_id WHERE t.batch_id = ?', [batchId])
  expect(results).toEqual({ n: size, distinctRows: size })
  const [ends] = await rowsOf<{ n: number }>(connection, 'SELECT COUNT(*) AS n FROM retrieval_events WHERE batch_id = ? AND phase = \'COMPLETED\'', [batchId])
  expect(ends!.n).toBe(size)
  await connection.end()
  const ids = await eventually(async () => {
    const mails = await (await fetch(`${stack.maildevUrl}/api/email`)).json() as { to: { address: string }[], headers: { 'message-id': string } }[]
    const mine = new Set(mails.filter(mail => mail.to[0]?.address === owner).map(mail => mail.headers['message-id']))
    return mine.size >= size && mine
  }, 'every mail is in the box', 60)
  expect(ids.size).toBe(size)
}

describe('a batch of 200 that is disturbed in its middle', () => {
  beforeAll(async () => {
    stack = await createStack('recovery')
    await startWeb(stack)
    await startWorker(stack)
  })
  afterAll(() => destroyStack(stack))

  const prepare = async (slug: string) => {
    const connection = await connect(stack.databaseUrl)
    try { return await uploadSpectra(connection, stack.origin, slug, size) }
    finally { await connection.end() }
  }

  it('stores every result once after the worker was killed', async () => {
    const spectra = await prepare('killed-worker')
    const batchId = await queueAndReachTheMiddle(spectra)
    await stop(stack.workers.pop()!, 'SIGKILL')
    await startWorker(stack)
    await expectEveryResultOnce(batchId, spectra.owner.email)
  })

  it('stores every result once after Redis was emptied', async () => {
    const spectra = await prepare('emptied-redis')
    const batchId = await queueAndReachTheMiddle(spectra)
    await emptyRedis(stack)
    await expectEveryResultOnce(batchId, spectra.owner.email)
  })

  it('stores every result once, and fails none, after twenty seconds without MariaDB', async () => {
    const spectra = await prepare('database-outage')
    const batchId = await queueAndReachTheMiddle(spectra)
    killDatabase(stack)
    await sleep(20_000)
    await startServices(stack)
    await expectEveryResultOnce(batchId, spectra.owner.email)
  })

  it('stores every result once after the worker was asked to stop and started again', async () => {
    const spectra = await prepare('stopped-worker')
    const batchId = await queueAndReachTheMiddle(spectra)
    await stop(stack.workers.pop()!, 'SIGTERM')
    const connection = await connect(stack.databaseUrl)
    expect((await counts(connection, batchId)).EXECUTING ?? 0, 'nothing is left behind as executing').toBe(0)
    await connection.end()
    await startWorker(stack)
    await expectEveryResultOnce(batchId, spectra.owner.email)
  })
})
