import { describe, expect, it } from 'vitest'
import { fitsBytes, floats, linear, linearImage } from './fits-bytes'
import { failure, numbers, readable } from './helpers'

const without = (key: string) => Object.fromEntries(Object.entries(linear).filter(([name]) => name !== key))

describe('a FITS image is read', () => {
  it('with its linear axis from CRVAL, CRPIX and CDELT', () => {
    expect(numbers(linearImage({ CRPIX1: 2 }))).toEqual([[499.5, 500, 500.5], [1, 2, 3], null])
  })

  it('with CD1_1 in place of CDELT1, with PC1_1, and downwards', () => {
    expect(numbers(fitsBytes({ ...without('CDELT1'), CD1_1: -0.5 }, floats([1, 2, 3])))[0]).toEqual([500, 499.5, 499])
    expect(numbers(linearImage({ PC1_1: 2 }))[0]).toEqual([500, 501, 502])
  })

  it('and warned about when CD1_1 and CDELT1 disagree', () => {
    const { spectrum } = readable(linearImage({ CD1_1: 0.25 }))
    expect([spectrum.axis[2], spectrum.warnings[0]]).toEqual([500.5, expect.stringContaining('CD1_1 was taken')])
  })

  it('as one row of two dimensions and as one column, with the axis of the long side', () => {
    expect(numbers(linearImage({ NAXIS: 2, NAXIS2: 1 }))[0]).toEqual([500, 500.5, 501])
    expect(numbers(fitsBytes({ BITPIX: -64, NAXIS: 2, NAXIS1: 1, NAXIS2: 3, CRPIX2: 1, CRVAL2: 10, CDELT2: 1 }, floats([1, 2, 3])))[0]).toEqual([10, 11, 12])
  })

  it('from the first image extension when the primary image is empty', () => {
    const file = [...fitsBytes({ BITPIX: 8, NAXIS: 0 }, new Uint8Array()), ...fitsBytes({ ...linear, PCOUNT: 0, GCOUNT: 1 }, floats([4, 5, 6]), true)]
    expect(numbers(Uint8Array.from(file))[1]).toEqual([4, 5, 6])
  })

  it('and says when further extensions follow', () => {
    const file = [...linearImage(), ...fitsBytes({ ...linear, PCOUNT: 0, GCOUNT: 1 }, floats([4, 5, 6]), true)]
    expect(readable(Uint8Array.from(file)).spectrum.warnings).toEqual(['The file has further extensions, which were not read.'])
  })

  it('without its undefined pixels, which are counted', () => {
    const { spectrum } = readable(linearImage({}, [1, Number.NaN, 3]))
    expect([[...spectrum.axis], [...spectrum.values], spectrum.warnings]).toEqual([[500, 501], [1, 3], ['1 undefined pixel was left out (the first is pixel 2).']])
  })

  it('when the last block is not filled up', () => {
    expect(numbers(linearImage().subarray(0, 2880 + 24))[1]).toEqual([1, 2, 3])
  })
})

describe('a FITS header states', () => {
  const about = (cards: Record<string, string | number>) => readable(linearImage(cards)).about

  // Meaning of CTYPE: Greisen et al. 2006, A&A 446, 747, table 1.
  it.each([
    [{ CTYPE1: 'WAVE', CUNIT1: 'Angstrom' }, 'angstrom', 'vacuum'],
    [{ CTYPE1: 'AWAV', CUNIT1: 'nm' }, 'nm', 'air'],
    [{ CTYPE1: 'FREQ', CUNIT1: 'GHz' }, 'GHz', 'vacuum'],
    [{ CTYPE1: 'WAVN', CUNIT1: 'cm-1' }, 'cm-1', 'vacuum'],
    [{ CTYPE1: 'LINEAR' }, null, null],
    [{ CTYPE1: 'WAVELENGTH', CUNIT1: 'parsec' }, null, null],
    [{ CTYPE1: 'WAVE' }, null, 'vacuum'],
  ])('%o: unit %s, medium %s', (cards, unit, medium) => {
    expect([about(cards as Record<string, string>).axisUnit, about(cards as Record<string, string>).medium]).toEqual([unit, medium])
  })

  it('metres, which become nm, and reciprocal metres, which become cm-1', () => {
    const metres = readable(linearImage({ CUNIT1: 'm', CRVAL1: 5e-7, CDELT1: 1e-9 }))
    expect([metres.about.axisUnit, metres.spectrum.axis[1]]).toEqual(['nm', expect.closeTo(501, 9)])
    const reciprocal = readable(linearImage({ CTYPE1: 'WAVN', CUNIT1: 'm-1', CRVAL1: 2e6, CDELT1: 100 }))
    expect([reciprocal.about.axisUnit, reciprocal.spectrum.axis[1]]).toEqual(['cm-1', expect.closeTo(20001, 9)])
  })

  it('date, exposure and unit of the values', () => {
    expect(about({ 'DATE-OBS': '2011-12-16T08:55:07.141', 'EXPTIME': 149.158, 'BUNIT': 'erg/s/cm2/Angstrom' })).toMatchObject({ observedAt: '2011-12-16T08:55:07.141Z', exposureSeconds: 149.158, valueUnit: 'erg/s/cm2/Angstrom', valueKind: 'energy' })
    expect(about({ 'DATE-OBS': '2011-12-16', 'TIME-OBS': '08:55:07' }).observedAt).toBe('2011-12-16T08:55:07.000Z')
  })

  it('no time when the date is old-fashioned, without a clock or in another time scale, and says so', () => {
    for (const cards of [{ 'DATE-OBS': '16/12/99' }, { 'DATE-OBS': '2011-12-16' }, { 'DATE-OBS': '2011-12-16T08:55:07', 'TIMESYS': 'TAI' }, { 'DATE-OBS': '2011-13-45T08:55:07' }]) {
      const outcome = readable(linearImage(cards as Record<string, string>))
      expect([outcome.about.observedAt, outcome.spectrum.warnings[0]]).toEqual([null, expect.stringContaining('DATE-OBS')])
    }
  })
})

describe('a FITS file that cannot be read says why', () => {
  it('two dimensions', () => {
    expect(failure(fitsBytes({ BITPIX: 8, NAXIS: 2, NAXIS1: 3, NAXIS2: 4 }, new Uint8Array(12)))).toMatchObject({ code: 'fits_not_one_dimensional', message: expect.stringContaining('3 x 4') })
  })

  it('cut off in the header and in the data', () => {
    expect(failure(linearImage().subarray(0, 400))).toMatchObject({ code: 'fits_truncated', where: 'header' })
    expect(failure(linearImage().subarray(0, 2880 + 20))).toMatchObject({ code: 'fits_truncated', where: 'data', message: expect.stringContaining('needs 2904 bytes and the file has 2900') })
  })

  it.each(['CRVAL1', 'CRPIX1', 'CDELT1'])('%s is missing', (key) => {
    expect(failure(fitsBytes(without(key), floats([1, 2, 3])))).toMatchObject({ code: 'fits_axis', where: key })
  })

  it.each(['NAXIS', 'NAXIS1', 'BITPIX'])('%s is missing', (key) => {
    expect(failure(fitsBytes(without(key), floats([1, 2, 3])))).toMatchObject({ code: 'fits_header', where: key })
  })

  it.each<Record<string, string | number>>([{ CTYPE1: 'WAVE-LOG' }, { CTYPE1: 'AWAV-GRI' }, { CTYPE1: 'VELO-LSR' }, { CTYPE1: 'MULTISPE' }, { 'DC-FLAG': 1 }, { CDELT1: 0 }])('%o is no axis that is read', (cards) => {
    expect(failure(linearImage(cards)).code).toBe('fits_axis')
  })

  it('a table instead of an image', () => {
    const file = [...fitsBytes({ BITPIX: 8, NAXIS: 0 }, new Uint8Array()), ...fitsBytes({ XTENSION: 'BINTABLE', BITPIX: 8, NAXIS: 2, NAXIS1: 8, NAXIS2: 3, PCOUNT: 0, GCOUNT: 1 }, new Uint8Array(24), true)]
    expect(failure(Uint8Array.from(file))).toMatchObject({ code: 'fits_no_image', message: expect.stringContaining('BINTABLE') })
  })

  it('an infinite pixel, only undefined pixels, and more than a million pixels', () => {
    expect(failure(linearImage({}, [1, Infinity, 3]))).toMatchObject({ code: 'not_finite', where: 'pixel 2' })
    expect(failure(linearImage({}, [Number.NaN, Number.NaN, Number.NaN])).code).toBe('too_few_pixels')
    expect(failure(linearImage({ NAXIS1: 1_000_001 })).code).toBe('too_many_pixels')
  })
})
