import { describe, expect, it } from 'vitest'
import { measureLines } from '#shared/engine/spectrum/measurement'
import type { LineMeasurementSet } from '#shared/engine/types'
import { draw, drawnLadder, inputFor, ladder, ladderArea } from './helpers'

const areas = ladder.map(line => ladderArea(line))
const sigmaOf = (set: LineMeasurementSet, i: number) => Math.sqrt(set.covariance[i * (set.areas.length + 1)])
const expectAreas = (set: LineMeasurementSet, relative: number) => areas.forEach((area, i) => expect(Math.abs(set.areas[i] / area - 1), set.labels[i]).toBeLessThan(relative))

describe('a spectrum without noise', () => {
  it('gives back areas, shift, width and continuum', () => {
    const set = measureLines(inputFor(draw({ lines: drawnLadder(0.04), continuum: x => 10 + 0.5 * (x - 1007.5) })))
    expectAreas(set, 1e-7)
    expect(set.shift).toBeCloseTo(0.04, 8)
    expect(set.fwhm).toBeCloseTo(0.3, 7)
    expect(set.continuum[0]).toBeCloseTo(10, 6)
    expect([set.converged, set.flags, set.noiseFromResiduals]).toEqual([true, [], null])
  })

  it.each([-0.8, -0.35, 0.35, 0.8])('finds a shift of %f nm, with lines 0.3 nm wide', (shift) => {
    const set = measureLines(inputFor(draw({ lines: drawnLadder(shift) })))
    expect(set.shift).toBeCloseTo(shift, 7)
    expectAreas(set, 1e-6)
  })

  it.each([0.12, 0.3, 0.9, 1.6])('finds a width of %f nm without being told', (fwhm) => {
    const set = measureLines(inputFor(draw({ lines: drawnLadder(), fwhm, from: 970, to: 1045 })))
    expect(Math.abs(set.fwhm / fwhm - 1)).toBeLessThan(fwhm < 0.2 ? 0.01 : 1e-6)
  })

  it('takes dips as lines where the observable is an equivalent width', () => {
    const dips = drawnLadder(0.03).map(line => ({ ...line, area: -line.area / 100 }))
    const set = measureLines(inputFor(draw({ lines: dips, continuum: () => 20, sigma: 0.01 }), { reading: { observable: 'equivalent-width', widthIn: 'wavelength' } }))
    areas.forEach((area, i) => expect(set.areas[i] / -area).toBeCloseTo(0.01, 7))
    expect(set.shift).toBeCloseTo(0.03, 6)
  })
})

describe('fixed and free', () => {
  const spectrum = draw({ lines: drawnLadder(0.02), seed: 5 })

  it('a fixed width stays as given and has no uncertainty', () => {
    const set = measureLines(inputFor(spectrum, { profile: { shape: 'gaussian', fwhm: 0.31 } }))
    expect([set.fwhm, set.uFwhm]).toEqual([0.31, null])
    expect(set.uShift).toBeGreaterThan(0)
  })

  it('a fixed shift is zero and has no uncertainty', () => {
    const set = measureLines(inputFor(spectrum, { shift: 'fixed' }))
    expect([set.shift, set.uShift]).toEqual([0, null])
    expect(set.uFwhm).toBeGreaterThan(0)
  })

  it('what is free makes the areas less certain, and takes a degree of freedom', () => {
    const free = measureLines(inputFor(spectrum))
    const fixed = measureLines(inputFor(spectrum, { profile: { shape: 'gaussian', fwhm: free.fwhm }, shift: 'fixed' }))
    expect(fixed.dof - free.dof).toBe(2)
    expect(sigmaOf(free, 0)).toBeGreaterThan(sigmaOf(fixed, 0))
  })

  it('shift and width are right within their stated uncertainty over many noises', () => {
    const sets = Array.from({ length: 60 }, (_, i) => measureLines(inputFor(draw({ lines: drawnLadder(0.02), sigma: 5, seed: 100 + i }))))
    const meanSquare = (pulls: number[]) => pulls.reduce((sum, pull) => sum + pull ** 2, 0) / pulls.length
    // 60 pulls: 1 +- 0.18; three of these.
    for (const pulls of [sets.map(set => (set.shift - 0.02) / set.uShift!), sets.map(set => (set.fwhm - 0.3) / set.uFwhm!), sets.map(set => (set.areas[0] - areas[0]) / sigmaOf(set, 0))]) {
      expect(Math.abs(meanSquare(pulls) - 1)).toBeLessThan(0.55)
    }
  })
})

describe('masks and unusable pixels', () => {
  const clean = draw({ lines: drawnLadder(), seed: 8 })
  const isIn = (x: number) => x >= 1002 && x <= 1003
  const spike = (value: number) => ({ ...clean, values: Array.from(clean.values, (y, i) => isIn(clean.wavelength[i]) ? value : y) })

  it('a masked range has no part in the fit, whatever stands there', () => {
    const masks: [number, number][] = [[1002, 1003]]
    const [without, withSpike] = [clean, spike(5000)].map(spectrum => measureLines(inputFor(spectrum, { masks })))
    expect(withSpike).toEqual(without)
    expect(measureLines(inputFor(clean)).dof - without.dof).toBeGreaterThanOrEqual(19)
    expect(measureLines(inputFor(spike(5000))).chi2).toBeGreaterThan(1000 * without.chi2)
  })

  it('a mask may be given from high to low', () => {
    expect(measureLines(inputFor(clean, { masks: [[1003, 1002]] }))).toEqual(measureLines(inputFor(clean, { masks: [[1002, 1003]] })))
  })

  it('pixels without a value or a usable sigma are left out', () => {
    const masked = measureLines(inputFor(clean, { masks: [[1002, 1003]] }))
    expect(measureLines(inputFor(spike(Number.NaN))).areas).toEqual(masked.areas)
    const sigma = Array.from(clean.wavelength, x => isIn(x) ? 0 : 1)
    expect(measureLines(inputFor({ ...clean, sigma })).areas).toEqual(masked.areas)
  })
})

describe('noise', () => {
  const sigma = 4
  const spectrum = draw({ lines: drawnLadder(), sigma, seed: 21 })

  it('comes from the residuals when no sigma is known, and when asked so', () => {
    const absent = measureLines(inputFor({ ...spectrum, sigma: null }))
    const asked = measureLines(inputFor(spectrum, { noise: 'from-residuals' }))
    expect(Math.abs(absent.noiseFromResiduals! / sigma - 1)).toBeLessThan(0.15)
    expect(asked).toEqual(absent)
    expect(absent.chi2).toBeCloseTo(absent.dof, 6)
  })

  it('known up to a factor gives the same areas and their covariance times chi2/dof', () => {
    const absolute = measureLines(inputFor(spectrum))
    const relative = measureLines(inputFor({ ...spectrum, sigma: Array.from(spectrum.sigma!, s => 10 * s) }, { noise: 'relative' }))
    const factor = absolute.chi2 / absolute.dof
    relative.areas.forEach((area, i) => expect(area / absolute.areas[i]).toBeCloseTo(1, 7))
    relative.covariance.forEach((value, k) => expect(value / absolute.covariance[k] / factor).toBeCloseTo(1, 5))
  })
})
