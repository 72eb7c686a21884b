import pino, { type DestinationStream, type Logger, type LoggerOptions } from 'pino'

/** Never written, wherever they stand in a logged object. */
const hidden = ['password', 'passwordHash', 'token', 'tokenHash', 'secret', 'authorization', 'cookie']
export const redactPaths = hidden.flatMap(name => [name, `*.${name}`, `*.*.${name}`, `*.*["${name}"]`])

// A failed query's error carries the query's values, in its text and beside it: addresses, hashes, spectra.
const withoutValues = (text: string) => text.replace(/\nparams: [\s\S]*?(?=\n {4}at |$(?!\n))/g, '')

function describeError(error: Error): Record<string, unknown> {
  const { params, message, stack, ...rest } = pino.stdSerializers.err(error) as unknown as Record<string, unknown>
  return { ...rest, message: withoutValues(String(message)), stack: withoutValues(String(stack)), ...(params === undefined ? {} : { params: '[hidden]' }) }
}

const hooks: LoggerOptions['hooks'] = {
  // Without words of its own a line would take the error's, unchecked.
  logMethod(input, method) {
    const [first] = input as [unknown]
    const error = first instanceof Error ? first : (first as { err?: unknown } | null)?.err
    if (input.length === 1 && error instanceof Error) return method.apply(this, [first, withoutValues(error.message)] as never)
    return method.apply(this, input)
  },
}

export const createLogger = (level: string, role: string, destination?: DestinationStream): Logger => {
  const options = { level, base: { role }, redact: { paths: [...new Set(redactPaths)], censor: '[hidden]' }, serializers: { err: describeError }, hooks }
  return destination ? pino(options, destination) : pino(options)
}

/** One JSON line an event; `requestId` ties a request, its job and its mail together. */
export const logger: Logger = createLogger(knownLevel(process.env.TROTLINE_LOG_LEVEL), process.env.TROTLINE_ROLE ?? 'web')

// A wrong level is reported by the check of the environment, which must be able to log.
function knownLevel(level: string | undefined): string {
  return level && (level in pino.levels.values || level === 'silent') ? level : 'info'
}
