import { DomainError } from '#shared/utils/domain-error'
import { config } from '../../config'
import { databasePool } from '../../database/client'
import { schemaIsCurrent, type Migration } from '../../database/migrate'
import { redisAnswers } from '../../jobs/counter'
import { storage } from '../storage/index'

/** full: what is there can be read, nothing can be added. */
export type CheckResult = 'ok' | 'full' | 'down'
export interface Readiness { status: 'ready' | 'degraded' | 'unavailable', role: string, checks: Record<'database' | 'schema' | 'storage' | 'redis', CheckResult> }

/** Whether this process can do its work now. Without Redis submissions wait; with a full storage uploads are refused: degraded, not away. */
export async function readiness(migrations: Migration[]): Promise<Readiness> {
  const [database, schema, stored, redis] = await Promise.all([
    check(async () => void await databasePool().query('SELECT 1')),
    check(() => schemaCheck(migrations)),
    check(() => storage().check()),
    check(async () => {
      if (!await redisAnswers()) throw new Error('no answer')
    }),
  ])
  const needed = database === 'ok' && schema === 'ok' && stored !== 'down'
  const status = !needed ? 'unavailable' : redis === 'ok' && stored === 'ok' ? 'ready' : 'degraded'
  return { status, role: config().role, checks: { database, schema, storage: stored, redis } }
}

async function schemaCheck(migrations: Migration[]): Promise<void> {
  if (!await schemaIsCurrent(databasePool(), migrations)) throw new Error('the schema is not current')
}

const patienceMs = 3000

async function check(attempt: () => Promise<void>): Promise<CheckResult> {
  const late = new Promise<CheckResult>(resolve => setTimeout(resolve, patienceMs, 'down').unref())
  return Promise.race([attempt().then(() => 'ok' as const, error => isFull(error) ? 'full' as const : 'down' as const), late])
}

const isFull = (error: unknown): boolean => error instanceof DomainError && error.code === 'storage_full'
