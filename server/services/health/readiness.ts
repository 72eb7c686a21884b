import { randomUUID } from 'node:crypto'
import { rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { config } from '../../config'
import { databasePool } from '../../database/client'
import { schemaIsCurrent, type Migration } from '../../database/migrate'
import { redisAnswers } from '../../jobs/counter'

export type CheckResult = 'ok' | 'down'
export interface Readiness { status: 'ready' | 'degraded' | 'unavailable', role: string, checks: Record<'database' | 'schema' | 'storage' | 'redis', CheckResult> }

/** Whether this process can do its work now. Without Redis submissions still succeed and wait: degraded, not away. */
export async function readiness(migrations: Migration[]): Promise<Readiness> {
  const [database, schema, storage, redis] = await Promise.all([
    check(async () => void await databasePool().query('SELECT 1')),
    check(() => schemaCheck(migrations)),
    check(storageCheck),
    check(async () => {
      if (!await redisAnswers()) throw new Error('no answer')
    }),
  ])
  const needed = database === 'ok' && schema === 'ok' && storage === 'ok'
  const status = !needed ? 'unavailable' : redis === 'ok' ? 'ready' : 'degraded'
  return { status, role: config().role, checks: { database, schema, storage, redis } }
}

async function schemaCheck(migrations: Migration[]): Promise<void> {
  if (!await schemaIsCurrent(databasePool(), migrations)) throw new Error('the schema is not current')
}

async function storageCheck(): Promise<void> {
  const probe = join(config().storageDir, `.probe-${randomUUID()}`)
  await writeFile(probe, '')
  await rm(probe)
}

const patienceMs = 3000

async function check(attempt: () => Promise<void>): Promise<CheckResult> {
  const late = new Promise<CheckResult>(resolve => setTimeout(resolve, patienceMs, 'down').unref())
  return Promise.race([attempt().then(() => 'ok' as const, () => 'down' as const), late])
}
