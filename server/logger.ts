import pino, { type DestinationStream, type Logger } from 'pino'

/** Never written, wherever they stand in a logged object. */
const hidden = ['password', 'passwordHash', 'token', 'tokenHash', 'secret', 'authorization', 'cookie']
export const redactPaths = hidden.flatMap(name => [name, `*.${name}`, `*.*.${name}`, `*.*["${name}"]`])

export const createLogger = (level: string, role: string, destination?: DestinationStream): Logger => {
  const options = { level, base: { role }, redact: { paths: [...new Set(redactPaths)], censor: '[hidden]' } }
  return destination ? pino(options, destination) : pino(options)
}

/** One JSON line an event; `requestId` ties a request, its job and its mail together. */
export const logger: Logger = createLogger(knownLevel(process.env.TROTLINE_LOG_LEVEL), process.env.TROTLINE_ROLE ?? 'web')

// A wrong level is reported by the check of the environment, which must be able to log.
function knownLevel(level: string | undefined): string {
  return level && (level in pino.levels.values || level === 'silent') ? level : 'info'
}
