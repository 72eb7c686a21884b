import { describe, expect, it } from 'vitest'
import { isDuplicateEntry } from '../../../../server/database/duplicate'

const driverError = (code: string) => Object.assign(new Error(code), { code })

describe('a statement that lost against a unique key', () => {
  it('is known by the driver\'s code, wrapped or not', () => {
    expect(isDuplicateEntry(driverError('ER_DUP_ENTRY'))).toBe(true)
    expect(isDuplicateEntry(new Error('Failed query', { cause: driverError('ER_DUP_ENTRY') }))).toBe(true)
  })

  it('is not any other error', () => {
    expect(isDuplicateEntry(new Error('Failed query', { cause: driverError('ER_LOCK_DEADLOCK') }))).toBe(false)
    expect(isDuplicateEntry('ER_DUP_ENTRY')).toBe(false)
  })
})
