import { createHash } from 'node:crypto'
import type { Pool, PoolConnection, RowDataPacket } from 'mysql2/promise'
import { withNamedLock } from './lock'

export interface Migration { name: string, sql: string }
interface Applied extends RowDataPacket { name: string, sha256: string, statementsDone: number, finishedAt: Date | null }

const separator = '--> statement-breakpoint'
export const statementsOf = (sql: string): string[] => sql.split(separator).map(part => part.trim()).filter(Boolean)
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex')

/** The schema in the database is not one that this code may touch. */
export class SchemaError extends Error {}

/**
 * Brings the schema forward to `migrations`, under a named lock so that processes starting together do it once.
 * DDL cannot be rolled back, so the number of finished statements is kept and a broken run carries on where it stopped.
 * @returns names of the migrations applied now
 */
export async function migrateDatabase(pool: Pool, migrations: Migration[]): Promise<string[]> {
  const applied = await withNamedLock(pool, 'trotline:migrate', 60, async (connection) => {
    await connection.query(`CREATE TABLE IF NOT EXISTS schema_migrations (
      name varchar(120) NOT NULL PRIMARY KEY, sha256 char(64) NOT NULL, statements_done int NOT NULL, finished_at datetime(3))`)
    const known = await readApplied(connection)
    checkApplied(known, migrations)
    const open = migrations.filter(migration => !known.find(row => row.name === migration.name)?.finishedAt)
    for (const migration of open) await apply(connection, migration, known.find(row => row.name === migration.name)?.statementsDone ?? null)
    return open.map(migration => migration.name)
  })
  if (!applied) throw new SchemaError('Another process has been changing the schema for more than a minute.')
  return applied
}

/** True when the database holds exactly the schema of this code. */
export async function schemaIsCurrent(pool: Pool, migrations: Migration[]): Promise<boolean> {
  const rows = await readApplied(pool)
  return rows.length === migrations.length && migrations.every(({ name }) => rows.some(row => row.name === name && row.finishedAt))
}

async function readApplied(connection: Pool | PoolConnection): Promise<Applied[]> {
  const [rows] = await connection.query<Applied[]>('SELECT name, sha256, statements_done AS statementsDone, finished_at AS finishedAt FROM schema_migrations ORDER BY name')
  return rows
}

export function checkApplied(applied: Pick<Applied, 'name' | 'sha256'>[], migrations: Migration[]): void {
  for (const row of applied) {
    const migration = migrations.find(({ name }) => name === row.name)
    if (!migration) throw new SchemaError(`The database has schema ${row.name}, which is newer than this version knows. Start the newer version.`)
    if (sha256(migration.sql) !== row.sha256) throw new SchemaError(`Schema ${row.name} in the database was made by another text than this version has.`)
  }
}

async function apply(connection: PoolConnection, migration: Migration, statementsDone: number | null): Promise<void> {
  if (statementsDone === null) {
    await connection.query('INSERT INTO schema_migrations (name, sha256, statements_done) VALUES (?, ?, 0)', [migration.name, sha256(migration.sql)])
  }
  const statements = statementsOf(migration.sql)
  for (let index = statementsDone ?? 0; index < statements.length; index++) {
    await connection.query(statements[index]!)
    await connection.query('UPDATE schema_migrations SET statements_done = ? WHERE name = ?', [index + 1, migration.name])
  }
  await connection.query('UPDATE schema_migrations SET finished_at = UTC_TIMESTAMP(3) WHERE name = ?', [migration.name])
}
