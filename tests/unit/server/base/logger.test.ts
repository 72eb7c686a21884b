import { DrizzleQueryError } from 'drizzle-orm/errors'
import { expect, it } from 'vitest'
import { createLogger } from '~~/server/logger'

it('secrets are hidden wherever they stand in a logged object', () => {
  const lines: string[] = []
  const logger = createLogger('info', 'web', { write: (line: string) => void lines.push(line) })
  logger.info({ password: 'hush', body: { token: 'hush' }, request: { headers: { authorization: 'hush', cookie: 'hush' } }, user: { name: 'Ann' } }, 'seen')
  expect(lines.join()).not.toContain('hush')
  expect(lines.join()).toContain('Ann')
})

it('a failed query is logged without its values', () => {
  const lines: string[] = []
  const logger = createLogger('info', 'web', { write: (line: string) => void lines.push(line) })
  const failure = new DrizzleQueryError('select * from users where note = ? and email = ?', ['first\nsecond', 'ann@example.org'], new Error('gone'))
  logger.error({ err: new Error('wrapped', { cause: failure }) })
  logger.error({ err: failure })
  logger.error(failure)
  expect(lines.join()).not.toContain('ann@example.org')
  expect(lines.join()).toContain('select * from users')
  expect(lines.join()).toContain('gone')
})
