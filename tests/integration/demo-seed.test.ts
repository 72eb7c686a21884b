import type { Connection } from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { nightTemperature } from '../../docker-free-scripts/demo/calendar.mjs'
import { connect, rowsOf } from '../helpers/accounts'
import { createStack, destroyStack, eventually, seed, startWeb, startWorker, type Stack } from '../helpers/stack'

interface Row { name: string, phase: string, temperature: number | null, u_noise: number | null, reason: string | null, flag_bits: number }

const tables = ['users', 'campaigns', 'memberships', 'stations', 'instruments', 'recipes', 'spectra', 'batches', 'retrievals'] as const
let stack: Stack
let connection: Connection

const counts = async () => Object.fromEntries(await Promise.all(tables.map(async table =>
  [table, (await rowsOf<{ n: number }>(connection, `SELECT COUNT(*) AS n FROM ${table}`))[0]!.n] as const)))
const rowsLike = (pattern: string) => rowsOf<Row>(connection, 'SELECT name, phase, temperature, u_noise, reason, flag_bits FROM retrievals WHERE name LIKE ? ORDER BY observed_at, name', [pattern])

describe('the invented demo', () => {
  beforeAll(async () => {
    stack = await createStack('demo-seed')
    await startWeb(stack)
    await startWorker(stack)
    await seed(stack, 'demo')
    connection = await connect(stack.databaseUrl)
  })
  afterAll(async () => {
    await connection?.end()
    await destroyStack(stack)
  })

  it('has sixty nights of two stations, twelve pointings, six troubled spectra and one account for each role', async () => {
    expect(await counts()).toMatchObject({ users: 5, campaigns: 2, memberships: 8, stations: 2, instruments: 2, spectra: 66, retrievals: 78 })
    expect(await rowsOf(connection, 'SELECT user_id FROM memberships m JOIN users u ON u.id = m.user_id WHERE u.is_administrator = 1')).toEqual([])
  })

  it('is not added a second time', async () => {
    const before = await counts()
    await seed(stack, 'demo')
    expect(await counts()).toEqual(before)
    expect(await rowsOf(connection, 'SELECT id FROM api_tokens')).toEqual([])
  })

  it('goes through the real queue to temperatures that agree with those it was made with', async () => {
    await eventually(async () => (await rowsOf<{ n: number }>(connection, 'SELECT COUNT(*) AS n FROM retrievals WHERE phase IN (\'QUEUED\', \'EXECUTING\')'))[0]!.n === 0, 'every retrieval has ended', 120)
    const nights = (await Promise.all(['HR-2%', 'LP-2%'].map(rowsLike))).flat()
    expect([nights.length, nights.filter(row => row.phase !== 'COMPLETED')]).toEqual([60, []])
    // Each within five standard uncertainties of its truth, and together no more scattered than the noise allows.
    const pulls = nights.map((row) => {
      const index = Math.round((Date.parse(row.name.slice(3, 13)) - Date.parse('2025-11-01')) / 86_400_000)
      return (row.temperature! - nightTemperature(index, row.name.startsWith('HR') ? 0 : 1)) / row.u_noise!
    })
    expect(Math.max(...pulls.map(Math.abs))).toBeLessThan(5)
    const meanSquare = pulls.reduce((sum, pull) => sum + pull * pull, 0) / pulls.length
    // 60 independent pulls: mean square 1 +/- sqrt(2/60); four of these either way.
    expect(Math.abs(meanSquare - 1)).toBeLessThan(4 * Math.sqrt(2 / 60))
    const pointings = await rowsLike('Quiet Cloud%')
    expect(pointings.map(row => row.phase)).toEqual(Array(12).fill('COMPLETED'))
    expect(pointings.every(row => row.temperature! > 7 && row.temperature! < 27)).toBe(true)
  })

  it('has spectra that fail, are flagged or wait for a person, each with its reason', async () => {
    const trouble = await rowsLike('HR-%')
    const named = (name: string) => trouble.find(row => row.name.startsWith(name))!
    expect(named('HR-medium-not-stated')).toMatchObject({ phase: 'HELD', temperature: null })
    expect(named('HR-wrong-range')).toMatchObject({ phase: 'ERROR', temperature: null })
    expect(named('HR-medium-not-stated').reason).toMatch(/air or vacuum/)
    expect(named('HR-wrong-range').reason).toMatch(/No chosen line lies in the spectrum/)
    for (const name of ['HR-saturated', 'HR-two-lines']) expect([name, named(name).flag_bits > 0]).toEqual([name, true])
    // Noise alone is no fault: the value stands, with the wide uncertainty that it deserves.
    expect(named('HR-clouded').u_noise).toBeGreaterThan(15)
  })
})
