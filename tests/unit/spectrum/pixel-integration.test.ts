import { describe, expect, it } from 'vitest'
import { measureLines } from '#shared/engine/spectrum/measurement'
import { draw, drawnLadder, inputFor, ladder, ladderArea } from './helpers'

/** Pixels of 0.25 nm, each holding the mean of the profile over itself, as a detector does. */
const pixel = 0.25
const measured = (fwhm: number, integrated: boolean) => measureLines(inputFor(draw({ lines: drawnLadder(0.06), fwhm, step: pixel, integrated })))
const worst = (areas: number[]) => Math.max(...ladder.map((line, i) => Math.abs(areas[i] / ladderArea(line) - 1)))

describe('lines narrower than two pixels', () => {
  it.each([0.8, 1, 1.5, 1.8])('of %f pixels are integrated over the pixels: area and width come out right', (pixels) => {
    const set = measured(pixels * pixel, true)
    expect(set.converged).toBe(true)
    expect(worst(set.areas)).toBeLessThan(1e-5)
    expect(Math.abs(set.fwhm / (pixels * pixel) - 1)).toBeLessThan(1e-4)
    expect(set.shift).toBeCloseTo(0.06, 5)
  })

  it('would not come out right by the values at the pixel centres', () => {
    const set = measured(0.9 * pixel, false)
    expect(worst(set.areas)).toBeGreaterThan(1e-3)
  })
})

it('lines of three pixels are taken by their values at the pixel centres', () => {
  expect(worst(measured(3 * pixel, false).areas)).toBeLessThan(1e-6)
})
