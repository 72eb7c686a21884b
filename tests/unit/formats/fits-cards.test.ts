import { describe, expect, it } from 'vitest'
import { fitsBytes, floats, linear, linearImage } from './fits-bytes'
import { failure, numbers, readable } from './helpers'

/** An image of three pixels with some cards written by hand in front of END. */
function withCards(cards: string[], { data = floats([1, 2, 3]), head = linear as Record<string, string | number> } = {}): Uint8Array {
  const plain = fitsBytes(head, data)
  const text = Array.from(plain.subarray(0, 2880), byte => String.fromCharCode(byte)).join('').trimEnd().replace(/END$/, '')
  const header = `${text}${cards.map(card => card.padEnd(80)).join('')}END`.padEnd(2880)
  return Uint8Array.from([...Array.from(header, char => char.charCodeAt(0)), ...plain.subarray(2880)])
}

const integers = (values: number[]) => {
  const view = new DataView(new ArrayBuffer(2 * values.length))
  values.forEach((value, index) => view.setInt16(2 * index, value))
  return new Uint8Array(view.buffer)
}
const integerImage = { ...linear, BITPIX: 16, NAXIS1: 4 }

describe('scaled FITS pixels', () => {
  it('are BZERO + BSCALE * stored, and those that are BLANK as stored are left out and counted', () => {
    const file = fitsBytes({ ...integerImage, BSCALE: 0.5, BZERO: 100, BLANK: -32768 }, integers([2, -32768, 0, -4]))
    expect(numbers(file)).toEqual([[500, 501, 501.5], [101, 100, 98], null])
    expect(readable(file).spectrum.warnings).toContain('1 undefined pixel was left out (the first is pixel 2).')
  })

  it('are compared with BLANK before they are scaled, and float images know no BLANK', () => {
    expect(numbers(fitsBytes({ ...integerImage, BSCALE: 2, BLANK: 4 }, integers([2, 4, 1, 0])))[1]).toEqual([4, 2, 0])
    expect(numbers(linearImage({ BLANK: 2 }))[1]).toEqual([1, 2, 3])
  })

  it('of 16 bits without a sign come with BZERO = 32768', () => {
    expect(numbers(fitsBytes({ ...integerImage, BZERO: 32768 }, integers([-32768, 0, 32767, 1])))[1]).toEqual([0, 32768, 65535, 32769])
  })

  it.each<[string, string[], string, RegExp]>([
    ['BSCALE = 0', ['BSCALE  =                    0'], 'BSCALE', /every pixel the same/],
    ['a decimal comma', ['BSCALE  =                  1,5'], 'BSCALE', /= 1,5 is neither a number nor a text/],
    ['a text', ['BZERO   = \'100\''], 'BZERO', /= '100' is not a number/],
  ])('are refused with %s', (_, cards, where, words) => {
    expect(failure(withCards(cards))).toMatchObject({ code: 'fits_header', where, message: expect.stringMatching(words) })
  })
})

describe('a FITS card that cannot be relied on', () => {
  it.each<[string, string[], string, RegExp]>([
    ['stands twice with different values', ['CRVAL1  =                501.0'], 'CRVAL1', /twice with different values \(500 and 501\)/],
    ['has an open quote', ['CTYPE1  = \'WAVE'], 'CTYPE1', /without its closing quote/],
    ['has its equals sign in the wrong column', ['CUNIT1=\'nm\''], 'CUNIT1', /equals sign in column 9/],
    ['holds two numbers', ['CD1_1   =                  0.5 0.6'], 'CD1_1', /neither a number/],
  ])('%s: the file is refused by name, because the card is needed', (_, cards, where, words) => {
    expect(failure(withCards(cards))).toMatchObject({ code: 'fits_header', where, message: expect.stringMatching(words) })
  })

  it('and only describes the spectrum is a warning', () => {
    const { spectrum, about } = readable(withCards(['EXPTIME = 12,5', 'BUNIT   = \'adu']))
    expect([about.exposureSeconds, about.valueUnit]).toEqual([null, null])
    expect(spectrum.warnings.join()).toMatch(/EXPTIME = 12,5.*BUNIT has a text without its closing quote/)
  })

  it('and is not needed hurts nobody, nor do the same value twice, bytes beyond ASCII and an undefined value', () => {
    expect(numbers(withCards(['GAIN    = 1,5', 'CRVAL1  =                500.0', 'COMMENT = 3 \u00B0C', 'TEMP    =                    3 / \u00B0C', 'BSCALE  =']))[1]).toEqual([1, 2, 3])
  })
})

describe('a FITS header that would lead astray', () => {
  it.each([['PCOUNT', -100_000], ['GCOUNT', -1], ['GCOUNT', 0], ['PCOUNT', 0.5]])('with %s = %d is refused instead of being followed backwards', (key, value) => {
    const file = [...fitsBytes({ BITPIX: 8, NAXIS: 0 }, new Uint8Array()), ...fitsBytes({ XTENSION: 'BINTABLE', BITPIX: 8, NAXIS: 1, NAXIS1: 3, [key]: value }, new Uint8Array(3), true)]
    expect(failure(Uint8Array.from(file))).toMatchObject({ code: 'fits_header', where: key })
  })

  it('to an image that no file can hold', () => {
    expect(failure(fitsBytes({ BITPIX: -64, NAXIS: 3, NAXIS1: 1e9, NAXIS2: 1e9, NAXIS3: 1e9 }, new Uint8Array())).message).toMatch(/no file can hold/)
  })

  it('to an axis that stands still or leaves the range of numbers', () => {
    expect(failure(linearImage({ CDELT1: 1e-20 })).code).toBe('axis_not_monotonic')
    expect(failure(linearImage({ CRVAL1: 1e308, CDELT1: 1e308 })).code).toBe('fits_axis')
  })
})

describe('the time of a FITS file', () => {
  const timeOf = (cards: Record<string, string>) => {
    const { about, spectrum } = readable(linearImage(cards))
    return [about.observedAt, spectrum.warnings.join(' ')]
  }
  it('may stand in DATE-BEG', () => expect(timeOf({ 'DATE-BEG': '2011-12-16T08:55:07' })).toEqual(['2011-12-16T08:55:07.000Z', '']))

  it.each<[string, Record<string, string>, RegExp]>([
    ['in the future', { 'DATE-OBS': '2999-01-01T00:00:00' }, /lies in the future.*State when/],
    ['before 1900', { 'DATE-OBS': '1011-12-16T08:55:07' }, /before 1900/],
    ['behind its own end', { 'DATE-OBS': '2011-12-16T08:55:07', 'DATE-END': '2011-12-16T08:45:07' }, /lies after DATE-END/],
    ['on the 30th of February', { 'DATE-OBS': '2011-02-30T08:55:07' }, /was not read as a time/],
  ])('is not taken %s, and it is said so', (_, cards, words) => expect(timeOf(cards)).toEqual([null, expect.stringMatching(words)]))
})
