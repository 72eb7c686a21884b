import { expect, it } from 'vitest'
import { countLocally } from '~~/server/jobs/counter'

it('counts within the window and starts anew after it', () => {
  const begun = 1_000_000
  expect(countLocally('a', 60, begun)).toEqual({ count: 1, secondsLeft: 60 })
  expect(countLocally('a', 60, begun + 20_000)).toEqual({ count: 2, secondsLeft: 40 })
  expect(countLocally('b', 60, begun + 20_000).count).toBe(1)
  expect(countLocally('a', 60, begun + 60_001)).toEqual({ count: 1, secondsLeft: 60 })
})
