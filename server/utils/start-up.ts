import { setTimeout as sleep } from 'node:timers/promises'
import { useStorage } from 'nitropack/runtime'
import { databasePool } from '../database/client'
import { migrateDatabase, SchemaError, type Migration } from '../database/migrate'
import { logger } from '../logger'

let bundled: Promise<Migration[]> | undefined

/** The migrations that were built into this server. */
export const bundledMigrations = (): Promise<Migration[]> => (bundled ??= readBundled())

async function readBundled(): Promise<Migration[]> {
  const storage = useStorage('assets:migrations')
  const names = (await storage.getKeys()).filter(key => key.endsWith('.sql')).sort()
  return Promise.all(names.map(async key => ({ name: key.replace(/\.sql$/, ''), sql: String(await storage.getItem(key)) })))
}

/** Waits for the database to answer, then brings its schema forward. Only a schema that may not be touched ends the wait at once. */
export async function prepareDatabase(patienceMs: number): Promise<void> {
  const migrations = await bundledMigrations()
  const deadline = Date.now() + patienceMs
  for (;;) {
    try {
      const applied = await migrateDatabase(databasePool(), migrations)
      if (applied.length) logger.info({ applied }, 'schema brought forward')
      return
    }
    catch (error) {
      if (error instanceof SchemaError || Date.now() > deadline) throw error
      logger.warn({ reason: (error as Error).message }, 'waiting for the database')
      await sleep(1000)
    }
  }
}
