import { describe, expect, it } from 'vitest'
import { airIndex } from '#shared/engine/units/air'
import type { AxisReading } from '#shared/engine/units/axis'
import { isFrequencyUnit, isWavelengthUnit, toVacuumNanometre } from '#shared/engine/units/axis'

const vacuum = (unit: AxisReading['unit']): AxisReading => ({ unit, medium: 'vacuum', airFormula: 'ciddor1996' })
const wavelengths = (axis: number[], reading: AxisReading) => {
  const result = toVacuumNanometre(axis, reading)
  if ('problem' in result) throw new Error(result.problem)
  return Array.from(result.wavelength)
}
const problem = (axis: number[], reading: AxisReading) => {
  const result = toVacuumNanometre(axis, reading)
  return 'problem' in result ? result.problem : null
}

/** c = 299792458 m/s exactly (SI): 1500 nm is 6666.66... cm-1 and 199.861638... THz. */
const hertz = 299792458 / 1500e-9

describe('every axis unit', () => {
  it.each<[AxisReading['unit'], number]>([
    ['nm', 1500], ['angstrom', 15000], ['um', 1.5], ['cm-1', 1e7 / 1500], ['Hz', hertz], ['MHz', hertz / 1e6], ['GHz', hertz / 1e9],
  ])('%s: %f is 1500 nm', (unit, value) => {
    const other = isFrequencyUnit(unit) ? value * 1500 / 1501 : value * 1501 / 1500
    const [first, second] = wavelengths([value, other], vacuum(unit))
    expect(Math.abs(first / 1500 - 1)).toBeLessThan(1e-14)
    expect(Math.abs(second / 1501 - 1)).toBeLessThan(1e-14)
  })

  it('is either one of wavelength or one that grows with energy, or pixels', () => {
    expect(['nm', 'angstrom', 'um', 'cm-1', 'GHz', 'MHz', 'Hz', 'pixel', null].map(unit => [isWavelengthUnit(unit), isFrequencyUnit(unit)])).toEqual([
      [true, false], [true, false], [true, false], [false, true], [false, true], [false, true], [false, true], [false, false], [false, false],
    ])
    expect(isWavelengthUnit('toString')).toBe(false)
  })

  it('says whether the wavelengths fall', () => {
    expect(toVacuumNanometre([1, 2, 3], vacuum('nm'))).toMatchObject({ descending: false })
    expect(toVacuumNanometre([3, 2, 1], vacuum('nm'))).toMatchObject({ descending: true })
    expect(toVacuumNanometre([1, 2, 3], vacuum('cm-1'))).toMatchObject({ descending: true })
  })
})

describe('air', () => {
  const air = (unit: AxisReading['unit']): AxisReading => ({ ...vacuum(unit), medium: 'air' })

  it('wavelengths become vacuum ones by the index at the vacuum wavelength, in every wavelength unit', () => {
    const [long] = wavelengths([1500, 1501], air('nm'))
    expect(Math.abs(long / airIndex(long, 'ciddor1996') / 1500 - 1)).toBeLessThan(1e-14)
    expect(Math.abs(wavelengths([15000, 15010], air('angstrom'))[0] / long - 1)).toBeLessThan(1e-14)
    expect(Math.abs(wavelengths([1.5, 1.501], air('um'))[0] / long - 1)).toBeLessThan(1e-14)
  })

  it('below 200 nm is taken as vacuum', () => {
    const [uv, seen] = wavelengths([199, 201], air('nm'))
    expect(uv).toBe(199)
    expect(seen).toBeGreaterThan(201.06)
  })

  it('has no meaning for wavenumbers and frequencies', () => {
    expect(problem([1, 2], air('cm-1'))).toBe('An axis in cm-1 has no air form: wavenumbers and frequencies are those in vacuum.')
  })
})

describe('an axis that cannot be read', () => {
  it.each<[string, number[], AxisReading, string]>([
    ['no unit', [1, 2], vacuum(null), 'The unit of the axis is not stated.'],
    ['pixels', [1, 2], vacuum('pixel'), 'The axis counts pixels and no wavelength solution is known: state the wavelength, wavenumber or frequency of each pixel.'],
    ['no medium', [1, 2], { ...vacuum('nm'), medium: null }, 'State whether the wavelengths are in vacuum or in air.'],
    ['one point', [1], vacuum('nm'), 'The axis has fewer than two points.'],
    ['zero', [1, 0], vacuum('nm'), 'The axis must be positive and finite; point 2 is 0.'],
    ['no number', [1, Number.NaN], vacuum('nm'), 'The axis must be positive and finite; point 2 is NaN.'],
    ['infinity', [1, Infinity], vacuum('nm'), 'The axis must be positive and finite; point 2 is Infinity.'],
    ['a turn', [1, 2, 1.5], vacuum('nm'), 'The axis must rise or fall throughout; it turns or stands still at point 3.'],
    ['a stand', [3, 2, 2], vacuum('nm'), 'The axis must rise or fall throughout; it turns or stands still at point 3.'],
  ])('(%s) gives a problem in words', (_, axis, reading, words) => {
    expect(problem(axis, reading)).toBe(words)
  })

  it('but needs no medium in wavenumber or frequency', () => {
    expect(problem([1, 2], { ...vacuum('GHz'), medium: null })).toBeNull()
  })
})
