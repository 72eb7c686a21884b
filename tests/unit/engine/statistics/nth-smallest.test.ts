import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { nthSmallest } from '#shared/engine/statistics/nth-smallest'

const numbers = fc.array(fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.integer({ min: 0, max: 3 })), { minLength: 1, maxLength: 60 })

describe('the n-th smallest', () => {
  it('is what a full sort puts there, with and without equal numbers', () => {
    fc.assert(fc.property(numbers, fc.nat(), (values, seed) => {
      const n = seed % values.length
      const sorted = Float64Array.from(values).sort()
      // -0 and 0 are equal to a comparison.
      expect(nthSmallest(Float64Array.from(values), n) === sorted[n]).toBe(true)
    }))
  })
})
