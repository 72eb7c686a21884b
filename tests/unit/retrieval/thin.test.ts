import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { thinnedPixels } from '#shared/utils/thin'

describe('thinning a spectrum for a plot', () => {
  it('leaves a short spectrum whole', () => {
    expect(thinnedPixels([3, 1, 2], 10)).toEqual([0, 1, 2])
  })

  it('keeps both ends, the highest and the lowest pixel, and no more than asked for', () => {
    fc.assert(fc.property(fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 1, maxLength: 3000 }), fc.integer({ min: 10, max: 400 }), (values, points) => {
      const kept = thinnedPixels(values, points)
      const shown = kept.map(pixel => values[pixel]!)
      expect(kept.length).toBeLessThanOrEqual(Math.max(points, 2))
      expect([kept[0], kept.at(-1)]).toEqual([0, values.length - 1])
      expect(kept.every((pixel, i) => i === 0 || pixel > kept[i - 1]!)).toBe(true)
      expect([Math.max(...shown), Math.min(...shown)]).toEqual([Math.max(...values), Math.min(...values)])
    }))
  })

  it('does not lose a line one pixel wide among a million', () => {
    const values = new Float64Array(1_000_000)
    values[654_321] = 1
    expect(thinnedPixels(values, 1000)).toContain(654_321)
  })
})
