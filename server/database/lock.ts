import type { Pool, PoolConnection, RowDataPacket } from 'mysql2/promise'

/**
 * Runs work while holding a named lock of the database server, on one connection of its own.
 * Answers null when the lock could not be had within `waitSeconds`. A died process frees its lock.
 */
export async function withNamedLock<T>(pool: Pool, name: string, waitSeconds: number, work: (connection: PoolConnection) => Promise<T>): Promise<T | null> {
  const connection = await pool.getConnection()
  try {
    const [rows] = await connection.query<RowDataPacket[]>('SELECT GET_LOCK(?, ?) AS got', [name, waitSeconds])
    if (rows[0]?.got !== 1) return null
    try {
      return await work(connection)
    }
    finally {
      await connection.query('SELECT RELEASE_LOCK(?)', [name])
    }
  }
  finally {
    connection.release()
  }
}
