import { drizzle } from 'drizzle-orm/mysql2'
import { createPool, type Pool } from 'mysql2/promise'
import * as schema from './schema'

const open = (pool: Pool) => drizzle(pool, { mode: 'planetscale', casing: 'snake_case', schema })

export type Database = ReturnType<typeof open>
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]
/** What a repository function takes first: the pool, or the transaction it runs in. */
export type Queryable = Database | Transaction

let connection: { pool: Pool, database: Database } | undefined

export const createDatabasePool = (url: string): Pool =>
  createPool({ uri: url, timezone: 'Z', charset: 'utf8mb4_general_ci', connectionLimit: 10, connectTimeout: 5000, enableKeepAlive: true })

/** Opens the pool; makes no connection until the first query. */
export function connectDatabase(url: string): Database {
  const pool = createDatabasePool(url)
  connection = { pool, database: open(pool) }
  return connection.database
}

export function database(): Database {
  if (!connection) throw new Error('The database is not connected yet.')
  return connection.database
}

/** The pool itself, for named locks, which live on one connection. */
export function databasePool(): Pool {
  if (!connection) throw new Error('The database is not connected yet.')
  return connection.pool
}

export async function closeDatabase(): Promise<void> {
  const closing = connection
  connection = undefined
  await closing?.pool.end()
}
