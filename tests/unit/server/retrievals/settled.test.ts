import { describe, expect, it } from 'vitest'
import { countSettled, patienceMs } from '../../../../server/services/retrievals/settled'

const young = (...ids: number[]) => ids.map(id => ({ id, ageMs: 10 }))
const old = (...ids: number[]) => ids.map(id => ({ id, ageMs: patienceMs + 1 }))

describe('events that may be told', () => {
  it('are all of those that follow on each other', () => {
    expect(countSettled(young(8, 9, 10), 7)).toBe(3)
    expect(countSettled([], 7)).toBe(0)
  })

  it('end before a young gap, behind which a smaller id may still be committed', () => {
    expect(countSettled(young(8, 10, 11), 7)).toBe(1)
    expect(countSettled(young(9), 7)).toBe(0)
  })

  it('go on behind a gap that has stood open for longer than any commit takes', () => {
    expect(countSettled(old(9, 10), 7)).toBe(2)
    expect(countSettled([...old(9), ...young(10, 12)], 7)).toBe(2)
  })
})
