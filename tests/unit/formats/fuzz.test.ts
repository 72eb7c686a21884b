import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readLineTable } from '#shared/formats/line-table-text/read-line-table'
import { readSpectrum } from '#shared/formats/read-spectrum'
import { JsonProblem, parseStrictJson } from '#shared/formats/strict-json'
import { unpackSpectrum } from '#shared/formats/pack-spectrum'
import { bytesOf } from './helpers'
import { fitsBytes } from './fits-bytes'

const runs = { numRuns: 10_000, seed: 20264, endOnFailure: true }
/** What one small input may take at worst, on a busy machine. */
const longestMs = 1000

/** Reads it, or refuses it for a reason that a reader knows; an exception of another kind would end as `unreadable`. */
function isReadOrRefused(bytes: Uint8Array): boolean {
  const begun = performance.now()
  const outcome = readSpectrum(bytes, 'fuzz.csv')
  expect(performance.now() - begun).toBeLessThan(longestMs)
  if (outcome.ok) {
    const { axis, values, sigma } = outcome.spectrum
    return axis.length === values.length && axis.length >= 2 && (sigma === null || sigma.length === axis.length) && values.every(Number.isFinite) && axis.every(Number.isFinite)
  }
  expect(outcome.error.code, outcome.error.message).not.toBe('unreadable')
  return outcome.error.message.length > 10 && outcome.error.message.length < 1000
}

const cell = fc.oneof(
  { weight: 6, arbitrary: fc.double().map(String) },
  { weight: 6, arbitrary: fc.integer({ min: -3, max: 2000 }).map(String) },
  fc.constantFrom('1,5', '1.501,5', '"3.5"', '"', '', ' ', 'nan', '-Inf', '1e400', '1d3', '0x10', '٣', '−5', '1e', '+', '.5', '5.', 'nm', 'λ', 'wavelength (nm)', 'flux', 'sigma', '#', '[nm]', '((', 'a_nm', '\u202E1', '\uFEFF'),
  fc.string({ maxLength: 12, unit: 'binary' }),
)
const rowOf = (mark: string) => fc.array(cell, { minLength: 0, maxLength: 6 }).map(cells => cells.join(mark))
const table = fc.tuple(fc.constantFrom(',', ';', '\t', ' ', '  ', ', '), fc.constantFrom('\n', '\r\n', '\r')).chain(([mark, end]) => fc.array(rowOf(mark), { maxLength: 12 }).map(rows => rows.join(end)))
const utf16 = (text: string, littleEnd: boolean) => Uint8Array.from([...(littleEnd ? [0xFF, 0xFE] : [0xFE, 0xFF]), ...Array.from(text, char => char.charCodeAt(0)).flatMap(code => littleEnd ? [code & 255, code >> 8] : [code >> 8, code & 255])])

const keyword = fc.constantFrom('BITPIX', 'NAXIS', 'NAXIS1', 'NAXIS2', 'CRVAL1', 'CRPIX1', 'CDELT1', 'CD1_1', 'PC1_1', 'CTYPE1', 'CUNIT1', 'BSCALE', 'BZERO', 'BLANK', 'PCOUNT', 'GCOUNT', 'XTENSION', 'BUNIT', 'DATE-OBS', 'DATE-END', 'TIMESYS', 'TIME-OBS', 'EXPTIME', 'DC-FLAG', 'WAT1_001')
const cardValue = fc.oneof(fc.constantFrom<(string | number | boolean)[]>(8, 16, -32, -64, 0, 1, 2, 3, -1, 999, 1e9, 1e300, 0.5, true, 'nm', 'WAVE', 'AWAV', 'BINTABLE', '2011-12-16T08:55:07', '2999-01-01T00:00:00', 'UTC', 'TAI'), fc.integer(), fc.double({ noNaN: true, noDefaultInfinity: true }), fc.string({ maxLength: 20 }))
const image = fc.record({ cards: fc.dictionary(keyword, cardValue, { maxKeys: 4 }), data: fc.uint8Array({ maxLength: 64 }), cut: fc.integer({ min: 0, max: 12_000 }), changes: fc.array(fc.tuple(fc.nat(6000), fc.nat(255)), { maxLength: 4 }), second: fc.boolean() })
  .map(({ cards, data, cut, changes, second }) => {
    const one = fitsBytes({ BITPIX: -64, NAXIS: 1, NAXIS1: 3, CRPIX1: 1, CRVAL1: 500, CDELT1: 0.5, ...cards }, data)
    const bytes = second ? Uint8Array.from([...one, ...fitsBytes({ XTENSION: 'IMAGE', BITPIX: 8, NAXIS: 1, NAXIS1: 3, ...cards }, data, true)]) : one
    for (const [at, byte] of changes) if (at > 10 && at < bytes.length) bytes[at] = byte
    return cut > 6000 ? bytes : bytes.subarray(0, Math.max(cut, 90))
  })

const spectrumLike = fc.record({
  name: fc.oneof(fc.string(), fc.constant(3)), axis: fc.oneof(fc.array(fc.double()), fc.anything()), values: fc.oneof(fc.array(fc.double()), fc.anything()),
  sigma: fc.anything(), axisUnit: fc.constantFrom('nm', 'furlong', null), observedAt: fc.constantFrom('2011-12-16', '2011-12-16T00:00:00Z', '9999-01-01T00:00:00Z', ''),
}, { requiredKeys: [] })
const json = fc.oneof(fc.json(), spectrumLike.map(value => JSON.stringify(value) ?? 'null'), fc.json().map(text => `{"axis":${text},"axis":[1,2]}`), fc.nat(3000).map(depth => '['.repeat(depth)), fc.json().chain(text => fc.nat(text.length).map(cut => `{${text.slice(0, cut)}`)))

describe('ten thousand inputs that nobody would send are read or refused, never thrown, and none takes long', () => {
  it('random bytes, behind nothing or behind the first bytes of a known format', () => {
    const starts = fc.constantFrom('', 'SIMPLE  =                    T', '{', '[', '\u00EF\u00BB\u00BF', '\u00FF\u00FE', '\u00FE\u00FF', '\u0089PNG', 'PK\u0003\u0004', '500,1\n')
    fc.assert(fc.property(starts, fc.uint8Array({ maxLength: 400 }), (start, rest) => isReadOrRefused(Uint8Array.from([...Array.from(start, char => char.charCodeAt(0)), ...rest]))), runs)
  })

  it('tables of numbers, words and marks', () => {
    fc.assert(fc.property(table, text => isReadOrRefused(bytesOf(text))), runs)
  })

  it('tables in UTF-16', () => {
    fc.assert(fc.property(table, fc.boolean(), (text, littleEnd) => isReadOrRefused(utf16(text, littleEnd))), { ...runs, numRuns: 2000 })
  })

  it('FITS images with odd cards, odd bytes and missing ends', () => {
    fc.assert(fc.property(image, isReadOrRefused), runs)
  }, 120_000)

  it('JSON of every shape', () => {
    fc.assert(fc.property(json, text => isReadOrRefused(bytesOf(text))), runs)
  })

  it('pasted line tables', () => {
    fc.assert(fc.property(table, (text) => {
      const reading = readLineTable(text)
      return reading.ok ? reading.lines.length > 0 : reading.problems.every(({ row, message }) => row >= 1 && message.length > 5 && message.length < 1000)
    }), runs)
  })

  it('packed columns of other bytes', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 80 }), (bytes) => {
      try {
        return unpackSpectrum(bytes).axis.length >= 0
      }
      catch (error) {
        return error instanceof RangeError && error.message.includes('packed spectrum')
      }
    }), runs)
  })

  it('JSON: what the strict parser takes is what the standard parser gives, and what it refuses is named', () => {
    fc.assert(fc.property(json, (text) => {
      try {
        expect(parseStrictJson(text)).toEqual(JSON.parse(text))
      }
      catch (error) {
        expect(error).toBeInstanceOf(JsonProblem)
      }
    }), runs)
  })
})

describe('inputs made to take long', () => {
  const megabyte = 1024 * 1024
  const times = (text: string, bytes: number) => text.repeat(Math.ceil(bytes / text.length))
  it.each<[string, string]>([
    ['a megabyte of spaces before a bracket, as a heading', `${' '.repeat(megabyte)}x(\n1 2\n2 3\n`],
    ['a heading of twenty thousand spaces and brackets', `${times('  (', 19_000)}\n1 2\n2 3\n`],
    ['a heading of twenty thousand underscores', `${times('_a', 19_000)}\n1 2\n2 3\n`],
    ['a row of a million cells', `1 2\n${times('1 ', 2 * megabyte)}\n`],
    ['a first row of a million cells', times('1,', 2 * megabyte)],
    ['a million comments', `${times('# a b\n', 6 * megabyte)}1 2\n2 3\n`],
    ['a comment of a megabyte', `#${times(' (a', megabyte)}\n1 2\n2 3\n`],
    ['a number of a million digits', `1 2\n${times('1', megabyte)} 3\n`],
    ['a million open quotes', `1,2\n${times('"', megabyte)},3\n`],
    ['a million opened lists', `{"a":${times('[', megabyte)}`],
    ['a megabyte of one JSON string', `{"name":"${times('a\\"', megabyte)}"}`],
    ['a hundred thousand unknown keys', `{${Array.from({ length: 100_000 }, (_, i) => `"k${i}":1`).join(',')}}`],
    ['a FITS header without an end', `SIMPLE  =                    T${' '.repeat(50)}${times('CRVAL1  =                500.0'.padEnd(80), 4 * megabyte)}`],
  ])('%s', (_, text) => {
    const begun = performance.now()
    const outcome = readSpectrum(bytesOf(text), 'slow.csv')
    expect(performance.now() - begun).toBeLessThan(2000)
    if (!outcome.ok) expect([outcome.error.code, outcome.error.message.length < 1000]).toEqual([expect.not.stringMatching('unreadable'), true])
  })
})
