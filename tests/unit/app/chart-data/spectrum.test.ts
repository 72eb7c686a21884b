import { describe, expect, it } from 'vitest'
import { fittedRange, spectrumSeries } from '~/utils/chart-data/spectrum'

const picture = { wavelength: [1, 2, 3, 4, 5], values: [10, 11, 12, 13, 14], model: [null, 10, 12.5, null, null], continuum: [null, 9, 9, null, null] }

describe('spectrumSeries', () => {
  it('draws no residual where nothing was fitted', () => {
    expect(spectrumSeries(picture).residual.map(point => point.y)).toEqual([null, 1, -0.5, null, null])
  })
})

describe('fittedRange', () => {
  it('spans the fitted pixels with a margin inside the axis', () => {
    const [low, high] = fittedRange(picture)!
    expect(low).toBeCloseTo(1.95, 9)
    expect(high).toBeCloseTo(3.05, 9)
  })
  it('is the whole axis where nothing was fitted', () => {
    expect(fittedRange({ ...picture, model: [null, null, null, null, null] })).toEqual([1, 5])
  })
  it('is null for an empty picture', () => {
    expect(fittedRange({ wavelength: [], values: [], model: [], continuum: [] })).toBeNull()
  })
})
