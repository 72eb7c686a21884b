import { createConnection } from 'mysql2/promise'
import { setting } from './environment.mjs'

/** Runs work on one connection to the service's database and closes it. */
export async function withDatabase(work) {
  const connection = await createConnection({ uri: setting('TROTLINE_DATABASE_URL'), timezone: 'Z', charset: 'utf8mb4' })
  try {
    return await work(connection)
  }
  finally {
    await connection.end()
  }
}

/** Runs a command-line script: a failure is one sentence and exit code 1. */
export async function runScript(main) {
  try {
    await main()
  }
  catch (error) {
    console.error(error.message)
    process.exitCode = 1
  }
}
