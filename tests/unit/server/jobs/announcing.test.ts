import { describe, expect, it } from 'vitest'
import { wantsOwnMail } from '../../../../server/services/outbox/announce-result'
import { waitAfter } from '../../../../server/services/outbox/deliver'

const asked = (mailPreference: 'each' | 'digest' | 'none', change = {}) => wantsOwnMail({ mailPreference, batchTotal: 20, batchDigestAt: null, revision: 1, ...change })

describe('a result of a batch', () => {
  it('has its own mail for who wants each, none for who wants none', () => {
    expect([asked('each'), asked('none'), asked('none', { batchTotal: 1 })]).toEqual([true, false, false])
  })

  it('waits for the digest of its batch', () => {
    expect(asked('digest')).toBe(false)
  })

  it('does not wait when there is no digest to come', () => {
    expect([asked('digest', { batchTotal: 1 }), asked('digest', { revision: 2 }), asked('digest', { batchDigestAt: new Date() })]).toEqual([true, true, true])
  })
})

describe('a mail that the server did not take', () => {
  it('is tried again after twice the time each time, at most an hour', () => {
    expect([1, 2, 3].map(waitAfter)).toEqual([2000, 4000, 8000])
    expect(waitAfter(30)).toBe(3600_000)
  })
})
