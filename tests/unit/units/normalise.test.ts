import { describe, expect, it } from 'vitest'
import { normaliseSpectrum } from '#shared/engine/units/normalise'
import { areaFactor } from '#shared/engine/spectrum/area-factor'
import { pointToVacuumNanometre } from '#shared/engine/units/axis'

const reading = { unit: 'cm-1', medium: null, airFormula: 'ciddor1996' } as const

describe('a spectrum on rising vacuum nm', () => {
  it('turns values and sigmas round with a falling axis and leaves the input alone', () => {
    const raw = { axis: [5000, 6250, 8000], values: [1, 2, 3], sigma: [0.1, 0.2, 0.3] }
    expect(normaliseSpectrum(raw, reading)).toEqual({ wavelength: Float64Array.of(1250, 1600, 2000), values: Float64Array.of(3, 2, 1), sigma: Float64Array.of(0.3, 0.2, 0.1) })
    expect(raw).toEqual({ axis: [5000, 6250, 8000], values: [1, 2, 3], sigma: [0.1, 0.2, 0.3] })
  })

  it('keeps the order of a rising axis, and no sigma stays none', () => {
    expect(normaliseSpectrum({ axis: [1, 2], values: [5, 6], sigma: null }, { ...reading, unit: 'nm', medium: 'vacuum' })).toEqual({ wavelength: Float64Array.of(1, 2), values: Float64Array.of(5, 6), sigma: null })
  })

  it('is a problem when columns differ in length or the axis cannot be read', () => {
    expect(normaliseSpectrum({ axis: [1, 2], values: [5], sigma: null }, reading)).toEqual({ problem: 'The axis has 2 points, the values 1.' })
    expect(normaliseSpectrum({ axis: [1, 2], values: [5, 6], sigma: [1] }, reading)).toEqual({ problem: 'The axis has 2 points, the sigmas 1.' })
    expect(normaliseSpectrum({ axis: [1, 1], values: [5, 6], sigma: null }, reading)).toHaveProperty('problem')
  })
})

describe('the width of 1 nm on another axis', () => {
  // The difference of the converted ends of a small interval, by the same definition of the units as in axis.test.ts.
  const around = 1524
  const half = 0.01
  it.each([['wavenumber', 1e7], ['frequency', 299792458]] as const)('%s is what the ends of an interval differ by', (axis, product) => {
    const width = (product / (around - half) - product / (around + half)) / (2 * half)
    expect(Math.abs(areaFactor(around, axis) / width - 1)).toBeLessThan(1e-8)
    expect(pointToVacuumNanometre(product / around, axis === 'wavenumber' ? 'cm-1' : 'GHz', 'vacuum', 'ciddor1996')).toBeCloseTo(around, 9)
  })

  it('velocity is c times the relative width, in km/s; wavelength is itself', () => {
    expect(areaFactor(around, 'velocity')).toBeCloseTo(299792.458 / around, 9)
    expect(areaFactor(around, 'wavelength')).toBe(1)
  })
})
