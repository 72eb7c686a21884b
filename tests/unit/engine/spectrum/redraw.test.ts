import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import { redrawPicture } from '#shared/engine/spectrum/redraw'
import type { RetrievalSettingsInput } from '#shared/schemas/settings'
import { nightInput } from '../../../helpers/night-input'

async function bothPictures(night: Parameters<typeof nightInput>[0], said: RetrievalSettingsInput = {}) {
  const input = await nightInput(night, said)
  const { spectrum } = retrieveFromSpectrum(input)
  return { input, measurement: spectrum!.measurement, first: spectrum!.picture, again: redrawPicture(input, JSON.parse(JSON.stringify(spectrum!.measurement)))! }
}

/** Largest difference between two drawn curves over the pixels of the fit, and how many those are. */
function compare(first: { wavelength: number[], model: (number | null)[] }, again: { wavelength: number[], model: (number | null)[] }) {
  const known = new Map(again.wavelength.map((x, i) => [x, again.model[i]]))
  const differences = first.wavelength.flatMap((x, i) => first.model[i] === null ? [] : [Math.abs(first.model[i]! - (known.get(x) ?? Infinity))])
  return { pixels: differences.length, largest: Math.max(...differences) }
}

describe('a measurement drawn again', () => {
  it.each([
    ['resolved lines', { fwhm: 0.22 }, {}],
    ['lines that share an area', { fwhm: 1.1 }, {}],
    ['lines narrower than two pixels', { fwhm: 0.07 }, {}],
    ['noise from the residuals', { fwhm: 0.22 }, { noise: 'from-residuals' as const }],
    ['a masked range and a curved continuum', { fwhm: 0.22 }, { masks: [[1530, 1531]] as [number, number][], continuumOrder: 3 }],
    ['a fixed width', { fwhm: 0.22 }, { profile: { fwhm: 0.25 } }],
  ])('is the model of the fit: %s', async (_, night, said) => {
    const { first, again } = await bothPictures(night, said)
    const { pixels, largest } = compare(first, again)
    expect(pixels).toBeGreaterThan(300)
    // Drawn numbers carry seven digits of values up to about 2000.
    expect(largest).toBeLessThan(0.01)
  })

  it('has lines that share an area in the case meant for them', async () => {
    const { measurement } = await bothPictures({ fwhm: 1.1 })
    expect(measurement.labels.some(label => label.includes(' + '))).toBe(true)
  })

  it('follows the spectrum within its noise', async () => {
    const { input, measurement, again } = await bothPictures({})
    const at = new Map(Array.from(input.spectrum.wavelength, (x, i) => [Math.round(x * 1e6) / 1e6, i]))
    const chi2 = again.wavelength.reduce((sum, x, i) => again.model[i] === null ? sum : sum + ((again.values[i]! - again.model[i]!) / input.spectrum.sigma![at.get(x)!]!) ** 2, 0)
    expect(chi2).toBeCloseTo(measurement.chi2, 1)
  })

  it('is not drawn for another line list, for no fit, or beyond the spectrum', async () => {
    const { input, measurement } = await bothPictures({})
    expect(redrawPicture(input, { ...measurement, labels: ['Z9(9)'] })).toBeNull()
    expect(redrawPicture(input, { ...measurement, labels: [] })).toBeNull()
    expect(redrawPicture(input, { ...measurement, fwhm: 0 })).toBeNull()
    expect(redrawPicture(input, { ...measurement, pixelRange: [0, 5000] })).toBeNull()
  })
})
