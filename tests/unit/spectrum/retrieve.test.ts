import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import type { ObservableReading, SpectrumRetrievalInput } from '#shared/engine/types'
import { notFinite } from '../engine/helpers/all-numbers'
import { nameOf, tableModel } from '../engine/helpers/tables'
import { draw, drawnLadder, inputFor, ladder, lineAt } from './helpers'

const c = 299792.458

/** Observables of a spectrum, what their intensity is integrated over, and how many of that 1 nm is at a wavelength (nm). */
const ways: [ObservableReading, SpectrumRetrievalInput['integrateOver'], (wavelength: number) => number][] = [
  [{ observable: 'photon-emission' }, 'wavelength', () => 1],
  [{ observable: 'photon-emission' }, 'wavenumber', x => 1e7 / x ** 2],
  [{ observable: 'energy-emission' }, 'wavelength', () => 1],
  [{ observable: 'brightness-integral', backgroundTemperature: 2.725 }, 'velocity', x => c / x],
  [{ observable: 'absorption-area' }, 'wavenumber', x => 1e7 / x ** 2],
  [{ observable: 'optical-depth-integral' }, 'velocity', x => c / x],
  [{ observable: 'envelope-only' }, 'frequency', x => c * 1000 / x ** 2],
]

/** Ladder far apart in wavelength, so that a wrong conversion would show. */
const wide = [0, 100, 240, 420].map((energy, i) => lineAt(`L${i + 1}`, 1000 + 60 * i, energy))
const options = { fwhm: 1.5, from: 960, to: 1220, step: 0.25, sigma: 1e-3 }

function areas(reading: ObservableReading, perNanometre: (wavelength: number) => number, temperature: number): number[] {
  const raw = wide.map(line => tableModel(reading, line.components[0], temperature) / perNanometre(1e7 / line.components[0].wavenumber))
  return raw.map(area => 300 * area / Math.max(...raw))
}
const drawn = (sizes: number[]) => wide.map((line, i) => ({ wavelength: 1e7 / line.components[0].wavenumber, area: sizes[i] }))

describe('lines drawn by the formulas of an observable', () => {
  it.each(ways.map(way => [nameOf(way[0]), way[1], way] as const))('give back 180 K: %s over %s', (_, integrateOver, [reading, , perNanometre]) => {
    const spectrum = draw({ ...options, lines: drawn(areas(reading, perNanometre, 180)) })
    const result = retrieveFromSpectrum(inputFor(spectrum, { lines: wide, reading, integrateOver }))
    expect(result.reason).toBeUndefined()
    expect(Math.abs(result.temperature!.value - 180)).toBeLessThan(1e-3)
  })

  it.each(['wavelength', 'wavenumber', 'velocity'] as const)('give back 180 K: equivalent widths in %s, of dips below a sloping continuum', (widthIn) => {
    const reading: ObservableReading = { observable: 'equivalent-width', widthIn }
    const perNanometre = (x: number) => ({ wavelength: 1, wavenumber: 1e7 / x ** 2, velocity: c / x })[widthIn]
    const continuum = (x: number) => 5000 + 8 * (x - 1090)
    const dips = drawn(areas(reading, perNanometre, 180)).map(({ wavelength, area }) => ({ wavelength, area: -area * continuum(wavelength) / 1000 }))
    const result = retrieveFromSpectrum(inputFor(draw({ ...options, lines: dips, continuum }), { lines: wide, reading, integrateOver: widthIn }))
    expect(result.lines.every(line => line.intensity > 0)).toBe(true)
    expect(Math.abs(result.temperature!.value - 180)).toBeLessThan(1e-3)
  })
})

describe('the result of a spectrum', () => {
  const spectrum = draw({ lines: drawnLadder(0.02), seed: 12 })
  const result = retrieveFromSpectrum(inputFor(spectrum))

  it('holds the measurement, whose areas are the lines\' intensities', () => {
    const { labels, areas } = result.spectrum!.measurement
    expect(result.lines.map(line => [line.label, line.intensity])).toEqual(labels.map((label, i) => [label, areas[i]]))
  })

  it('uses the covariance of the areas: a free width hardly adds to T, as it moves all lines alike', () => {
    const fixed = retrieveFromSpectrum(inputFor(spectrum, { profile: { shape: 'gaussian', fwhm: result.spectrum!.measurement.fwhm } }))
    expect(result.temperature!.uNoise / fixed.temperature!.uNoise).toBeLessThan(1.05)
    expect(result.lines[0].sigma! / fixed.lines[0].sigma!).toBeGreaterThan(1.05)
  })

  it('is right within its uncertainty over many noises', () => {
    const pulls = Array.from({ length: 80 }, (_, i) => {
      const { temperature } = retrieveFromSpectrum(inputFor(draw({ lines: drawnLadder(), sigma: 3, seed: 500 + i })))
      return (temperature!.value - 200) / temperature!.uNoise
    })
    // 80 pulls: mean 0 +- 0.11, mean square 1 +- 0.16; three of these and a half.
    expect(Math.abs(pulls.reduce((a, b) => a + b) / 80)).toBeLessThan(0.4)
    expect(Math.abs(pulls.reduce((sum, pull) => sum + pull ** 2, 0) / 80 - 1)).toBeLessThan(0.56)
  })

  it('keeps the mark of sets that are for comparison only, and their strengths with their lines', () => {
    const rates = ladder.map(() => [1])
    const { strengthSets, components } = retrieveFromSpectrum(inputFor(spectrum, {
      strengthSet: 'own', lines: [...ladder].reverse(), alternatives: [{ name: 'rough', comparisonOnly: true, einsteinA: rates.map(([rate], i) => [rate * 2 ** i]) }],
    }))
    expect(strengthSets[1]).toMatchObject({ name: 'rough', comparisonOnly: true })
    // The low lines have the larger rates; taken the other way round it would read about 120 K.
    expect(strengthSets[1].temperature).toBeGreaterThan(400)
    expect(components.map(({ name }) => name)).not.toContain('strength set')
  })
})

describe('the picture of a spectrum', () => {
  it('draws the window and a quarter to either side; the model only where pixels took part', () => {
    const spectrum = draw({ lines: drawnLadder(), seed: 12 })
    const { picture, measurement } = retrieveFromSpectrum(inputFor(spectrum, { masks: [[1002, 1003]] })).spectrum!
    const inFit = picture.wavelength.filter((_, i) => picture.model[i] !== null)
    expect([inFit[0], inFit.at(-1)]).toEqual(measurement.pixelRange.map(index => Math.round(spectrum.wavelength[index] * 1e6) / 1e6))
    expect(inFit.some(x => x >= 1002 && x <= 1003)).toBe(false)
    expect(picture.wavelength[0]).toBeLessThan(inFit[0])
    const atPeak = picture.wavelength.findIndex(x => Math.abs(x - 1000) < 1e-6)
    expect(Math.abs(picture.model[atPeak]! - picture.values[atPeak])).toBeLessThan(5)
    expect(Math.abs(picture.continuum[atPeak]! - 10)).toBeLessThan(0.5)
  })

  it('has no more than 4000 points', () => {
    const { picture } = retrieveFromSpectrum(inputFor(draw({ lines: drawnLadder(), step: 0.001, seed: 12 }))).spectrum!
    expect(picture.wavelength.length).toBeGreaterThan(2000)
    expect(picture.wavelength.length).toBeLessThanOrEqual(4000)
  })
})

it('answers odd spectra without an exception or a number that is not finite, and with a reason wherever there is no temperature', () => {
  const odd = fc.oneof({ weight: 6, arbitrary: fc.double({ min: -1e3, max: 1e3, noNaN: true }) }, fc.constantFrom(0, 1e300, -1e300, 1e-300, Number.NaN, Infinity))
  const spectrum = fc.record({
    wavelength: fc.tuple(fc.double({ min: 985, max: 1005, noNaN: true }), fc.double({ min: 1e-3, max: 1, noNaN: true })).map(([from, step]) => Array.from({ length: 60 }, (_, i) => from + i * step)),
    values: fc.array(odd, { minLength: 60, maxLength: 60 }),
    sigma: fc.option(fc.array(odd, { minLength: 60, maxLength: 60 })),
  })
  const change = fc.record({
    noise: fc.constantFrom('absolute' as const, 'relative' as const, 'from-residuals' as const),
    shift: fc.constantFrom('free' as const, 'fixed' as const),
    continuumOrder: fc.nat(8),
    profile: fc.record({ shape: fc.constant('gaussian' as const), fwhm: fc.option(fc.double({ min: 1e-6, max: 1e3, noNaN: true })) }),
  })
  fc.assert(fc.property(spectrum, change, (one, changes) => {
    const result = retrieveFromSpectrum(inputFor(one, changes))
    expect(notFinite(result)).toEqual([])
    expect(result.temperature === null).toBe(result.reason !== undefined)
  }), { numRuns: 2000, seed: 7 })
})
