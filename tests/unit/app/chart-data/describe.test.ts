import { describe, expect, it } from 'vitest'
import { describeBoltzmann, describeSpectrum } from '~/utils/chart-data/describe'
import { powerOf, superscript } from '~/utils/chart-data/power'

describe('pictures in words', () => {
  it('names the strongest value and the lines of the model', () => {
    const words = describeSpectrum({ wavelength: [1600, 1601, 1602], values: [1, 9, 2], model: [], continuum: [] }, [{ label: 'P1(2)', band: '4-2', x: 1601, used: true, row: 0 }])
    expect(words).toContain('highest value, 9.000, stands at 1601.00')
    expect(words).toContain('P1(2) at 1601.00 nm')
  })
  it('names marks without logarithm and marks at or below three sigma', () => {
    const point = { band: '4-2', x: 0, low: 1, high: 3, used: true }
    const words = describeBoltzmann({ edge: 0, energyTitle: '', bands: [{ band: '4-2', fit: [{ x: 0, y: 2 }, { x: 1, y: 1 }], points: [
      { ...point, label: 'a', y: 2, hollow: false, atEdge: false }, { ...point, label: 'b', y: 1, hollow: true, atEdge: false }, { ...point, label: 'c', y: 0, hollow: true, atEdge: true },
    ] }] })
    expect(words).toContain('falls from 2.00 to 1.00')
    expect(words).toContain('At or below three sigma: b.')
    expect(words).toContain('Zero or negative, on the edge: c.')
  })
})

describe('powers of ten', () => {
  it('are taken out of very large and very small values only', () => {
    expect([powerOf([7.8e8, null, -3]), powerOf([2e-17]), powerOf([812, 5]), powerOf([])]).toEqual([8, -17, 0, 0])
  })
  it('are written as superscripts', () => expect(superscript(-17)).toBe('⁻¹⁷'))
})
