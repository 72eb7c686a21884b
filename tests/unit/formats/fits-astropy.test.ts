import { execFileSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { readable } from './helpers'

/** Truth: astropy reads the same bytes (files that it wrote, and two real night-sky sums, see tests/truth/spectra/SOURCE.md). */
interface AstropyRecord { name: string, file: string, values: (number | null)[], axis: number[] }
const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))
const real = ['a', 'b'].map(letter => here(`../../truth/spectra/nearir_sky_${letter}.fits`))
const records = JSON.parse(execFileSync('/usr/bin/python3', ['-W', 'ignore', here('astropy-fits.py'), ...real], { encoding: 'utf8', maxBuffer: 2 ** 26 })) as AstropyRecord[]

describe('FITS values and axes agree with astropy', () => {
  it('on ten files', () => expect(records.length).toBe(10))

  it.each(records.map(record => [record.name, record] as const))('%s', (name, record) => {
    const { spectrum } = readable(new Uint8Array(Buffer.from(record.file, 'base64')))
    const defined = record.values.flatMap((value, index) => value === null ? [] : [{ value, axis: record.axis[index]! }])
    expect(spectrum.values.length).toBe(defined.length)
    // astropy scales 16-bit integers in single precision (2^-23 of BZERO = 400 and of the value); all else is the same double.
    const single = name.startsWith('int16') ? 2 ** -23 : 0
    defined.forEach(({ value, axis }, index) => {
      expect(Math.abs(spectrum.values[index]! - value)).toBeLessThanOrEqual(single * (400 + Math.abs(value)))
      expect(Math.abs(spectrum.axis[index]! - axis)).toBeLessThanOrEqual(1e-14 * Math.abs(axis))
    })
  })

  it('and the real files state date and exposure, and neither unit nor medium nor what they count', () => {
    for (const record of records.filter(({ name }) => name.startsWith('nearir_sky'))) {
      const { about, missing, spectrum } = readable(new Uint8Array(Buffer.from(record.file, 'base64')))
      expect(about).toMatchObject({ observedAt: '2011-12-16T08:55:07.141Z', exposureSeconds: 149.158, axisUnit: null, medium: null })
      expect(missing).toEqual(['axisUnit', 'medium', 'valueKind'])
      expect(spectrum.warnings.join()).toContain('units=angstroms')
    }
  })
})
