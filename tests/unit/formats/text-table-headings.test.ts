import { describe, expect, it } from 'vitest'
import type { AxisUnit } from '../../../shared/types/spectrum'
import { failure, numbers, readable } from './helpers'

const withHeading = (heading: string) => `${heading}\n500,1\n501,2\n`

describe('a heading states a unit only when it says it outright', () => {
  it.each<[string, AxisUnit | null]>([
    ['wavelength (nm),flux', 'nm'],
    ['wavelength_nm,flux', 'nm'],
    ['Wavelength/nm,flux', 'nm'],
    ['lambda [Angstrom],flux', 'angstrom'],
    ['wavelength (Å),flux', 'angstrom'],
    ['wavelength (\u212B),flux', 'angstrom'],
    ['wavelength (µm),flux', 'um'],
    ['wavelength (μm),flux', 'um'],
    ['wavenumber [cm-1],flux', 'cm-1'],
    ['wavenumber (cm⁻¹),flux', 'cm-1'],
    ['frequency (GHz),flux', 'GHz'],
    ['frequency_MHz,flux', 'MHz'],
    ['pixel,flux', 'pixel'],
    ['wavelength,flux', null],
    ['wavenumber,flux', null],
    ['frequency,flux', null],
    ['wavelength (furlong),flux', null],
  ])('%s', (heading, unit) => {
    expect(readable(withHeading(heading)).about.axisUnit).toBe(unit)
  })

  it('and none when it names two', () => {
    const { about, missing, spectrum } = readable(withHeading('wavelength_nm [Angstrom],flux'))
    expect([about.axisUnit, missing.includes('axisUnit'), spectrum.warnings[0]]).toEqual([null, true, 'The heading "wavelength_nm [Angstrom]" names two units; neither was taken.'])
  })

  it('and the medium likewise', () => {
    const medium = (heading: string) => readable(withHeading(heading)).about.medium
    expect(['air wavelength (nm),f', 'wavelength_vac (nm),f', '"wavelength (nm, vacuum)",f', 'wavelength (nm),f', 'wavelength (nm) vac or air,f'].map(medium)).toEqual(['air', 'vacuum', 'vacuum', null, null])
  })

  it('and what the values count by their unit; counts and ADU are asked', () => {
    const kind = (unit: string) => readable(withHeading(`wavelength,intensity (${unit})`)).about.valueKind
    expect(['rayleigh/nm', 'photons s-1', 'kR', 'erg s-1 cm-2', 'W m-2', 'mW', 'Jy', 'counts', 'ADU', 'electrons', 'a.u.'].map(kind)).toEqual(['photons', 'photons', 'photons', 'energy', 'energy', 'energy', 'energy', null, null, null, null])
    expect(readable(withHeading('wavelength,intensity (rayleigh/nm)')).about.valueUnit).toBe('rayleigh/nm')
  })
})

describe('columns are found by their names', () => {
  it('in any order, with sigma', () => {
    const outcome = readable('flux_err flux wavelength\n0.1 5 500\n0.2 6 501\n')
    expect([outcome.about.columns, outcome.missing.includes('columns')]).toEqual([{ axis: 2, values: 1, sigma: 0 }, false])
    expect(outcome.spectrum.columnNames).toEqual(['flux_err', 'flux', 'wavelength'])
  })

  it('in a comment line, in spaced names with bracketed units, and in a second line of units', () => {
    expect(readable('# wavelength_nm intensity sigma\n500 1 1\n501 2 1\n').about).toMatchObject({ axisUnit: 'nm', columns: { axis: 0, values: 1, sigma: 2 } })
    expect(readable('wavelength (nm)   intensity (W m-2)\n500 1\n501 2\n').about).toMatchObject({ axisUnit: 'nm', valueUnit: 'W m-2' })
    expect(readable('Wavelength\tCounts\nnm\tADU\n500\t1\n501\t2\n').about).toMatchObject({ axisUnit: 'nm', valueUnit: 'ADU' })
  })

  it('and lines of text above are skipped and counted', () => {
    expect(readable('Station Hill\nExposure: 100 s\nwavelength,flux\n500,1\n501,2').spectrum.warnings).toEqual(['2 lines of text before the table were skipped.'])
  })

  it('two columns without a heading are axis and values, without a question', () => {
    expect(readable('500 1\n501 2').missing).not.toContain('columns')
  })

  it('three columns without a heading are a proposal to be confirmed', () => {
    const outcome = readable('500 1 0.1\n501 2 0.1')
    expect([outcome.about.columns, outcome.missing[0], outcome.spectrum.stated.columns]).toEqual([{ axis: 0, values: 1, sigma: 2 }, 'columns', undefined])
  })

  it('a proposal takes the first ordered column as axis and no sigma that is not positive', () => {
    expect(readable('5 500 -1\n4.5 501 2\n7 502 3').about.columns).toEqual({ axis: 1, values: 0, sigma: null })
  })

  it('names that say nothing, or twice the same, are asked', () => {
    expect(readable(withHeading('a,b')).missing).toContain('columns')
    expect(readable('wavelength,flux,counts\n500,1,2\n501,2,3').missing).toContain('columns')
  })

  it('the person who says which column is which wins', () => {
    expect(numbers('wavelength,flux,counts\n500,1,2\n501,2,3', { columns: { axis: 0, values: 2, sigma: null } })).toEqual([[500, 501], [2, 3], null])
    expect(failure('500,1\n501,2', { columns: { axis: 0, values: 5, sigma: null } })).toMatchObject({ code: 'columns', message: 'Column 6 was chosen, but the file has 2 columns.' })
    expect(failure('500,1\n501,2', { columns: { axis: 0, values: 0, sigma: null } }).code).toBe('columns')
  })
})
