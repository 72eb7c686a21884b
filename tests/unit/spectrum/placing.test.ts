import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import { airShift } from '#shared/engine/units/air'
import { draw, drawnLadder, inputFor, ladder, lineAt } from './helpers'

const retrieve = (...input: Parameters<typeof inputFor>) => retrieveFromSpectrum(inputFor(...input))

describe('lines outside the spectrum', () => {
  it('are set aside one by one, with their place and the spectrum\'s range', () => {
    const result = retrieve(draw({ lines: drawnLadder(), to: 1012, seed: 6 }))
    expect(result.lines.find(line => line.label === 'L4')).toMatchObject({
      used: false, reason: 'it stands at 1015.00 nm, outside the spectrum (990.00 to 1012.00 nm)',
    })
    expect(result.flags).toContain('line-rejected')
    expect(result.temperature).not.toBeNull()
  })

  it('all of them give a reason that names both ranges', () => {
    const result = retrieve(draw({ lines: [], from: 600, to: 650, seed: 6 }))
    expect(result.temperature).toBeNull()
    expect(result.reason).toBe('No chosen line lies in the spectrum: the lines stand at 1000.00 to 1015.00 nm (vacuum), the spectrum covers 600.00 to 650.00 nm.')
    expect(result.lines.map(line => line.reason)).toEqual(Array(4).fill(expect.stringContaining('outside the spectrum (600.00 to 650.00 nm)')))
  })

  it('by no more than air shifts a line make the medium doubtful', () => {
    const air = airShift(1000)
    const one = [lineAt('L1', 1000)]
    expect(retrieve(draw({ lines: [], from: 1000 + 0.8 * air, to: 1020 }), { lines: one }).reason).toContain('is the medium stated rightly?')
    expect(retrieve(draw({ lines: [], from: 1000 + 2 * air, to: 1020 }), { lines: one }).reason).not.toContain('medium')
  })

  it('without a usable wavenumber say so', () => {
    const broken = { ...ladder[3], components: [{ ...ladder[3].components[0], wavenumber: Number.NaN }] }
    const result = retrieve(draw({ lines: drawnLadder(), seed: 6 }), { lines: [...ladder.slice(0, 3), broken] })
    expect(result.lines.find(line => line.label === 'L4')).toMatchObject({ used: false, reason: 'the line has no usable wavenumber' })
  })

  it('behind a mask are set aside', () => {
    const result = retrieve(draw({ lines: drawnLadder(), seed: 6 }), { masks: [[1009.5, 1010.5]] })
    expect(result.lines.find(line => line.label === 'L3')).toMatchObject({ used: false, reason: 'most of its pixels are masked, missing or beyond the end of the spectrum' })
    expect(result.temperature).not.toBeNull()
  })
})

describe('a medium stated wrongly', () => {
  const fwhm = 0.05
  const sharp = (sign: number) => draw({ lines: drawnLadder().map(line => ({ ...line, wavelength: line.wavelength + sign * airShift(line.wavelength) })), fwhm, step: 0.01, seed: 6, sigma: 3 })

  it('is named when all lines stand where air would put them', () => {
    const result = retrieve(sharp(-1), { fwhmStart: fwhm })
    expect(result.temperature).toBeNull()
    expect(result.reason).toMatch(/All lines stand about 0\.27\d nm at shorter wavelength .* taken as vacuum but look like air/)
    expect(retrieve(sharp(1), { fwhmStart: fwhm }).reason).toMatch(/at longer wavelength .* taken as air but look like vacuum/)
  })

  it('is not suspected when the lines stand in their places', () => {
    expect(retrieve(sharp(0), { fwhmStart: fwhm }).reason).toBeUndefined()
  })
})

describe('a spectrum that cannot be fitted', () => {
  const flat = draw({ lines: drawnLadder(), seed: 6 })

  it.each([
    ['too short', { wavelength: [1000, 1001], values: [1, 2], sigma: null }, 'The spectrum has 2 points; at least 5 are needed.'],
    ['columns of different length', { ...flat, values: [1, 2] }, 'The spectrum\'s columns differ in length.'],
    ['a turning axis', { ...flat, wavelength: Array.from(flat.wavelength, (x, i) => i === 7 ? 990 : x) }, 'The wavelengths must rise throughout; they do not at point 8.'],
    ['a wavelength of zero', { ...flat, wavelength: Array.from(flat.wavelength, (x, i) => i === 0 ? 0 : x) }, 'The wavelength of point 1 is not a positive number.'],
    ['no values', { ...flat, values: Array.from(flat.values, () => Number.NaN) }, 'Too few usable pixels around the lines.'],
  ])('(%s) is answered with a reason', (_, spectrum, reason) => {
    const result = retrieve(spectrum)
    expect([result.temperature, result.reason, result.converged]).toEqual([null, reason, false])
  })
})
