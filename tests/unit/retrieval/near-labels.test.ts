import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { editDistance, nearLabels } from '#shared/utils/retrieval/near-labels'

describe('edit distance', () => {
  it.each([['', '', 0], ['', 'abc', 3], ['P1(2)', 'P1(2)', 0], ['P1(2)', 'P1(3)', 1], ['P1(2)', 'P12', 2], ['kitten', 'sitting', 3]])('of "%s" and "%s" is %d', (a, b, distance) => {
    expect(editDistance(a, b)).toBe(distance)
  })

  it('is a distance', () => {
    const word = fc.string({ maxLength: 8 })
    fc.assert(fc.property(word, word, word, (a, b, c) => {
      expect(editDistance(a, b)).toBe(editDistance(b, a))
      expect(editDistance(a, c)).toBeLessThanOrEqual(editDistance(a, b) + editDistance(b, c))
      expect(editDistance(a, b) === 0).toBe(a === b)
    }))
  })
})

it('near labels come nearest first, once each, whatever the case and blanks', () => {
  const labels = ['P1(2)', 'P1(3)', 'Q1(2)', 'P1(2)', 'R2(10)']
  expect(nearLabels('p1 (2)', labels)).toEqual(['P1(2)', 'P1(3)', 'Q1(2)', 'R2(10)'])
  expect(nearLabels('R2(1)', labels, 1)).toEqual(['R2(10)'])
})
