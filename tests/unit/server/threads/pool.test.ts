import { afterEach, beforeAll, describe, expect, it } from 'vitest'
import { loadLineList } from '#shared/line-lists/index'
import { lineTableSchema } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import { fitTable } from '#shared/utils/retrieval/fit'
import { bundleThread } from '../../../../server/threads/bundle.mjs'
import { createThreadPool, ThreadFault, ThreadTimeLimit, type ThreadPool } from '../../../../server/threads/pool'
import { lineTable } from '../../../helpers/line-tables'

let source: string
let pool: ThreadPool
const never = new AbortController().signal
const options = { lineList: null, seconds: 20, signal: never }
const ask = { table: lineTableSchema.parse(lineTable(187.4)), settings: settingsSchema.parse({}) }

/** A thread that never answers `endless`, dies on `deadly` and otherwise says what it was sent. */
const oddThread = `const { parentPort } = require('node:worker_threads')
parentPort.on('message', ({ ask, lineList }) => {
  if (ask.endless) for (;;) {}
  if (ask.deadly) process.exit(3)
  if (ask.wrong) parentPort.postMessage({ fault: 'it went wrong' })
  else parentPort.postMessage({ answer: { lineList } })
})`
const odd = (what: object) => what as typeof ask

beforeAll(async () => { source = await bundleThread() })
afterEach(() => pool.close())

describe('a computing thread', () => {
  it('gives the digits that the same code gives here', async () => {
    pool = createThreadPool(source, 1)
    const here = fitTable({ ...ask, lineList: null })
    const there = await pool.run('fitTable', ask, options)
    expect(there).toEqual(here)
    expect(there.result?.temperature?.value).toBeCloseTo(187.4, 6)
  })

  it('answers a problem of the input in words', async () => {
    pool = createThreadPool(source, 1)
    const answer = await pool.run('fitSpectrum', { bytes: new TextEncoder().encode('rubbish'), name: 'x.csv', about: {} as never, settings: ask.settings }, options)
    expect(answer.problems?.[0]?.message.length).toBeGreaterThan(10)
  })

  it('gets a line list once', async () => {
    pool = createThreadPool(oddThread, 1)
    const lineList = await loadLineList('co-rotation') as LineList
    const first = await pool.run('fitTable', odd({}), { ...options, lineList }) as unknown as { lineList: object }
    const second = await pool.run('fitTable', odd({}), { ...options, lineList }) as unknown as { lineList: object }
    expect(first.lineList).toEqual({ key: `co-rotation@${lineList.version}`, list: lineList })
    expect(second.lineList).toEqual({ key: `co-rotation@${lineList.version}` })
  })
})

describe('a task', () => {
  it('that is aborted ends at once with the reason, and the next one is done', async () => {
    pool = createThreadPool(oddThread, 1)
    const abort = new AbortController()
    const endless = pool.run('fitTable', odd({ endless: true }), { ...options, signal: abort.signal })
    const next = pool.run('fitTable', odd({}), options)
    const why = new Error('not wanted any more')
    setTimeout(() => abort.abort(why), 100)
    const begun = performance.now()
    await expect(endless).rejects.toBe(why)
    expect(performance.now() - begun).toBeLessThan(2000)
    expect(await next).toEqual({ lineList: null })
  })

  it('that is aborted before its turn is not begun', async () => {
    pool = createThreadPool(oddThread, 1)
    await expect(pool.run('fitTable', odd({}), { ...options, signal: AbortSignal.abort(new Error('too late')) })).rejects.toThrow('too late')
  })

  it('that is aborted while it waits ends without holding the others up', async () => {
    pool = createThreadPool(oddThread, 1)
    const [first, waits] = [new AbortController(), new AbortController()]
    const endless = pool.run('fitTable', odd({ endless: true }), { ...options, signal: first.signal })
    const waiting = pool.run('fitTable', odd({ endless: true }), { ...options, signal: waits.signal })
    waits.abort(new Error('changed my mind'))
    await expect(waiting).rejects.toThrow('changed my mind')
    first.abort(new Error('enough'))
    await expect(endless).rejects.toThrow('enough')
    expect(await pool.run('fitTable', odd({}), options)).toEqual({ lineList: null })
  })

  it('that takes longer than its seconds ends; its wait for a thread does not count', async () => {
    pool = createThreadPool(oddThread, 1)
    const endless = pool.run('fitTable', odd({ endless: true }), { ...options, seconds: 0.6 })
    const quick = pool.run('fitTable', odd({}), { ...options, seconds: 0.5 })
    await expect(endless).rejects.toBeInstanceOf(ThreadTimeLimit)
    expect(await quick).toEqual({ lineList: null })
  })

  it('that fails or kills its thread is told so, and the next one is done', async () => {
    pool = createThreadPool(oddThread, 1)
    await expect(pool.run('fitTable', odd({ wrong: true }), options)).rejects.toThrow('it went wrong')
    await expect(pool.run('fitTable', odd({ deadly: true }), options)).rejects.toBeInstanceOf(ThreadFault)
    expect(await pool.run('fitTable', odd({}), options)).toEqual({ lineList: null })
  })
})
