import { mkdirSync } from 'node:fs'
import { defineNitroPlugin } from 'nitropack/runtime'
import { config, ConfigError } from '../config'
import { closeDatabase, connectDatabase } from '../database/client'
import { beginStart, onStop, runStopStage, stopEverything } from '../lifecycle'
import { logger } from '../logger'
import { prepareDatabase } from '../utils/start-up'

/** Starts the process, and alone owns its end: other parts register with onStop(). */
export default defineNitroPlugin((nitroApp) => {
  checkEnvironment()
  connectDatabase(config().databaseUrl)
  onStop('database', 'database', closeDatabase)
  beginStart(() => prepareDatabase(120_000)).catch((error: Error) => giveUp(error.message))

  // The server waits for open answers before its close hook, so event streams must end at the signal itself.
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void runStopStage('streams'))
  nitroApp.hooks.hookOnce('close', stopEverything)
})

function checkEnvironment(): void {
  try {
    mkdirSync(config().storageDir, { recursive: true })
  }
  catch (error) {
    giveUp(error instanceof ConfigError ? error.message : `The storage folder cannot be used: ${(error as Error).message}`)
  }
}

function giveUp(reason: string): never {
  logger.fatal(reason)
  process.stderr.write(`Trotline cannot start. ${reason}\n`)
  process.exit(1)
}
