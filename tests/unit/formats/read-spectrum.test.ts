import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { packSpectrum, unpackSpectrum } from '../../../shared/formats/pack-spectrum'
import { linearImage } from './fits-bytes'
import { failure, numbers, read, readable } from './helpers'

const body = { name: 'night 12', axis: [500, 501], values: [1, 2] }
const json = (more: object = {}) => JSON.stringify({ ...body, ...more })

describe('what a person says and what a file states', () => {
  it('the person wins over the file, and null says nothing', () => {
    const text = 'air wavelength (nm),intensity (rayleigh)\n500,1\n501,2\n'
    expect(readable(text, { axisUnit: 'angstrom', medium: null }).about).toMatchObject({ axisUnit: 'angstrom', medium: 'air', valueKind: 'photons' })
  })

  it('what neither says is missing, and nothing is assumed', () => {
    const { about, missing } = readable('500,1\n501,2')
    expect([about.axisUnit, about.medium, about.valueKind, missing]).toEqual([null, null, null, ['axisUnit', 'medium', 'valueKind']])
    expect(readable('500,1\n501,2', { axisUnit: 'nm', medium: 'vacuum', valueKind: 'photons' }).missing).toEqual([])
  })

  it('wavenumbers and frequencies are vacuum and not asked; a pixel axis has no medium', () => {
    for (const axisUnit of ['cm-1', 'GHz', 'MHz', 'Hz'] as const) expect(readable('500,1\n501,2', { axisUnit })).toMatchObject({ about: { medium: 'vacuum' }, missing: ['valueKind'] })
    expect(readable('0,1\n1,2', { axisUnit: 'pixel' })).toMatchObject({ about: { medium: null }, missing: ['valueKind'] })
  })
})

describe('the content decides, not the name', () => {
  it('FITS, JSON and text are told apart', () => {
    expect([linearImage(), json(), '500,1\n501,2'].map(content => readable(content).spectrum.format)).toEqual(['fits', 'json', 'text'])
  })

  it('bytes that begin like a format and break off are an error, never an exception', () => {
    const whole = [...linearImage()]
    fc.assert(fc.property(fc.nat(whole.length), fc.array(fc.tuple(fc.nat(2880), fc.nat(255)), { maxLength: 5 }), (length, changes) => {
      const bytes = Uint8Array.from(whole)
      for (const [at, byte] of changes) bytes[at + 10] = byte
      return typeof read(bytes.subarray(0, length)).ok === 'boolean'
    }))
    fc.assert(fc.property(fc.nat(json().length), length => typeof read(json().slice(0, length)).ok === 'boolean'))
  })
})

describe('a JSON spectrum', () => {
  it('is read with what it says about itself', () => {
    const outcome = readable(json({ sigma: [0.1, 0.2], axisUnit: 'nm', medium: 'air', valueKind: 'energy', observedAt: '2011-12-16T08:55:07Z' }))
    expect([numbers(json({ sigma: [0.1, 0.2] })), outcome.missing]).toEqual([[[500, 501], [1, 2], [0.1, 0.2]], []])
    expect(outcome.about).toMatchObject({ axisUnit: 'nm', medium: 'air', valueKind: 'energy', observedAt: '2011-12-16T08:55:07Z' })
  })

  it.each<[string, string, string, string | undefined, RegExp]>([
    ['without a name', JSON.stringify({ axis: [1, 2], values: [1, 2] }), 'json_invalid', 'name', /name/],
    ['with an unknown field', json({ colour: 'red' }), 'json_invalid', undefined, /colour/],
    ['with an unknown unit', json({ axisUnit: 'furlong' }), 'json_invalid', 'axisUnit', /one of nm/],
    ['with text among its numbers', json({ values: [1, '2'] }), 'json_invalid', 'values.1', /"2", not a finite number/],
    ['with null among its numbers', json({ values: [1, null] }), 'json_invalid', 'values.1', /null/],
    ['with an endless number', json().replace('[1,2]', '[1,1e999]'), 'json_syntax', 'values.1', /1e999 is not a finite number/],
    ['with NaN', json().replace('[1,2]', '[1,NaN]'), 'json_syntax', undefined, /neither NaN nor Infinity/],
    ['with fewer values than pixels', json({ values: [1] }), 'ragged_row', 'values', /equally many/],
    ['with a sigma too many', json({ sigma: [1, 1, 1] }), 'ragged_row', 'sigma', /3 numbers and axis has 2/],
    ['with a sigma of zero', json({ sigma: [1, 0] }), 'sigma_not_positive', 'item 1', /greater than zero/],
    ['with a repeated axis value', json({ axis: [500, 500] }), 'axis_not_monotonic', 'item 1', /repeats/],
    ['with one pixel', json({ axis: [500], values: [1] }), 'too_few_pixels', undefined, /at least 2/],
    ['that is a list', '[1, 2]', 'json_invalid', undefined, /is an object such as/],
    ['that breaks off', '{"name": "a", "axis": [1,', 'json_syntax', undefined, /not valid JSON/],
  ])('%s is refused', (_, content, code, where, message) => {
    const error = failure(content)
    expect([error.code, error.where]).toEqual([code, where])
    expect(error.message).toMatch(message)
  })
})

describe('a packed spectrum', () => {
  it('comes back bit by bit, with and without sigma, also from the middle of a buffer', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.double(), fc.double(), fc.double())), fc.boolean(), fc.nat(9), (rows, withSigma, offset) => {
      const column = (index: 0 | 1 | 2) => Float64Array.from(rows, row => row[index])
      const columns = { axis: column(0), values: column(1), sigma: withSigma ? column(2) : null }
      const packed = packSpectrum(columns)
      const shifted = new Uint8Array(packed.length + offset)
      shifted.set(packed, offset)
      expect(unpackSpectrum(shifted.subarray(offset))).toEqual(columns)
    }))
  })

  it('of other bytes, or cut off, is a RangeError', () => {
    const packed = packSpectrum({ axis: Float64Array.of(1, 2), values: Float64Array.of(1, 2), sigma: null })
    for (const bytes of [new Uint8Array(), new Uint8Array(16), packed.subarray(0, 40)]) expect(() => unpackSpectrum(bytes)).toThrow(RangeError)
    expect(() => packSpectrum({ axis: Float64Array.of(1), values: Float64Array.of(1, 2), sigma: null })).toThrow(RangeError)
  })
})
