import { expect, it } from 'vitest'
import { createLogger } from '~~/server/logger'

it('secrets are hidden wherever they stand in a logged object', () => {
  const lines: string[] = []
  const logger = createLogger('info', 'web', { write: (line: string) => void lines.push(line) })
  logger.info({ password: 'hush', body: { token: 'hush' }, request: { headers: { authorization: 'hush', cookie: 'hush' } }, user: { name: 'Ann' } }, 'seen')
  expect(lines.join()).not.toContain('hush')
  expect(lines.join()).toContain('Ann')
})
