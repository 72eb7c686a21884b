import type { Pool, RowDataPacket } from 'mysql2/promise'

/** What the database server calls itself, and the newest schema in it. */
export async function readDatabaseVersions(pool: Pool): Promise<{ server: string, schema: string | null }> {
  const [[server]] = await pool.query<RowDataPacket[]>('SELECT VERSION() AS version')
  const [[schema]] = await pool.query<RowDataPacket[]>('SELECT MAX(name) AS name FROM schema_migrations WHERE finished_at IS NOT NULL')
  return { server: String(server?.version), schema: schema?.name ?? null }
}
