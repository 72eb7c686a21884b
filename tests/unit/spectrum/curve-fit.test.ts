import { describe, expect, it } from 'vitest'
import { measureLines } from '#shared/engine/spectrum/measurement'
import { runPython } from '../../truth/python/run-python'
import { draw, inputFor, lineAt } from './helpers'

interface Answer { areas: number[], covariance: number[], shift: number, uShift: number, fwhm: number, uFwhm: number, chi2: number }

const fwhm = 0.32
/** Fourteen invented lines, some of them close enough to share pixels. */
const centres = [1002, 1002.5, 1004.1, 1006, 1006.45, 1008.2, 1010, 1011.7, 1012.15, 1014, 1016.3, 1016.75, 1018.4, 1020]
const drawn = centres.map((wavelength, i) => ({ wavelength: wavelength + 0.021, area: 60 + 35 * ((7 * i) % 5) }))
const spectrum = draw({ lines: drawn, fwhm, sigma: 3, seed: 14, continuum: x => 20 + 0.4 * (x - 1010) - 0.02 * (x - 1010) ** 2 })
const input = inputFor(spectrum, { lines: centres.map((centre, i) => lineAt(`L${i}`, centre)), continuumOrder: 2, fwhmStart: 0.3 })

function curveFit(masked: (x: number) => boolean, [first, last]: [number, number]): Answer {
  const kept = Array.from({ length: last - first + 1 }, (_, i) => first + i).filter(i => !masked(spectrum.wavelength[i]))
  const take = (from: ArrayLike<number>) => kept.map(i => from[i])
  return runPython<Answer>('curve_fit_spectrum.py', {
    wavelength: take(spectrum.wavelength), values: take(spectrum.values), sigma: take(spectrum.sigma!),
    centres, areas: centres.map(() => 100), fwhm: 0.3, order: 2,
  })
}

/** scipy.optimize.curve_fit fits all 19 parameters at once, with its own formulas of model and Jacobian. */
describe.each([
  ['all pixels', [] as [number, number][]],
  ['a masked range', [[1012.6, 1013.3], [1005, 1005.4]] as [number, number][]],
])('14 lines, shift, width and three continuum terms over %s', (_, masks) => {
  const set = measureLines({ ...input, masks })
  const answer = curveFit(x => masks.some(([from, to]) => x >= from && x <= to), set.pixelRange)
  const sigma = (i: number) => Math.sqrt(answer.covariance[15 * i])

  it('have the areas of curve_fit to 1e-6', () => {
    expect(set.converged).toBe(true)
    answer.areas.forEach((area, i) => expect(Math.abs(set.areas[i] / area - 1), `line ${i}`).toBeLessThan(1e-6))
  })

  it('have its covariance of the areas to 1e-6 of their sigmas', () => {
    answer.covariance.forEach((value, k) => {
      const scale = sigma(Math.floor(k / 14)) * sigma(k % 14)
      expect(Math.abs(set.covariance[k] - value) / scale, `element ${k}`).toBeLessThan(1e-6)
    })
  })

  it('have its shift, width and chi2, with their uncertainties', () => {
    expect(Math.abs(set.shift - answer.shift)).toBeLessThan(1e-6 * answer.uShift)
    expect(Math.abs(set.fwhm - answer.fwhm)).toBeLessThan(1e-6 * answer.uFwhm)
    expect(Math.abs(set.uShift! / answer.uShift - 1)).toBeLessThan(1e-6)
    expect(Math.abs(set.uFwhm! / answer.uFwhm - 1)).toBeLessThan(1e-6)
    expect(Math.abs(set.chi2 / answer.chi2 - 1)).toBeLessThan(1e-9)
  })
})
