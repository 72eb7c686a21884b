import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import type { SpectrumRetrievalInput } from '#shared/engine/types'
import { draw, drawnLadder, inputFor, ladder, lineAt } from './helpers'

const clean = draw({ lines: drawnLadder(), seed: 2 })
const flags = (input: SpectrumRetrievalInput) => retrieveFromSpectrum(input).flags
const labels = ladder.map(line => line.label)

it('a sound spectrum has no flag and its temperature', () => {
  const result = retrieveFromSpectrum(inputFor(clean))
  expect([result.flags, result.reason, result.converged]).toEqual([[], undefined, true])
  expect(Math.abs(result.temperature!.value - 200)).toBeLessThan(4 * result.temperature!.uNoise)
})

describe('blend', () => {
  /** A list line beside L3 with its energy and `part` of its strength, not in the fit. */
  const neighbour = (distance: number, part: number) => lineAt('X', 1010 + distance, 240, 'a', part)

  it.each([[0.1, 0.03], [0.29, 0.03], [-0.2, 0.5]])('is raised for a list line %f nm away that adds %f of the line', (distance, part) => {
    const result = retrieveFromSpectrum(inputFor(clean, { neighbours: [neighbour(distance, part)] }))
    expect(result.flags).toContain('blend')
    expect(result.cautions.at(-1)).toContain(`X stands ${Math.abs(distance).toFixed(3)} nm away and may add ${Math.round(100 * part)} %`)
  })

  it.each([[0.1, 0.015], [0.35, 0.5]])('is not raised for one %f nm away that adds %f of it', (distance, part) => {
    expect(flags(inputFor(clean, { neighbours: [neighbour(distance, part)] }))).toEqual([])
  })

  it('counts at the fitted temperature: a hot line is faint in a cold gas', () => {
    const hot = lineAt('H', 1010.1, 3000, 'a', 1)
    expect(flags(inputFor(clean, { neighbours: [hot] }))).toEqual([])
  })

  it('weighs a line that was left out because it cannot be told from a used one', () => {
    const result = retrieveFromSpectrum(inputFor(clean, { lines: [...ladder, neighbour(0.1, 0.5)], usedLabels: labels }))
    expect(result.flags).toContain('blend')
    expect(result.lines.map(line => line.label)).not.toContain('X')
  })

  it('is not asked of a line that has an area of its own', () => {
    const beside = draw({ lines: [...drawnLadder(), { wavelength: 1010.25, area: 20 }], seed: 2 })
    expect(flags(inputFor(beside, { lines: [...ladder, neighbour(0.25, 0.5)], usedLabels: labels }))).toEqual([])
  })
})

describe('saturated', () => {
  const peak = Math.max(...Array.from(clean.values))

  it('is raised at the full scale and not below it', () => {
    expect(flags(inputFor({ ...clean, fullScale: peak }))).toContain('saturated')
    expect(flags(inputFor({ ...clean, fullScale: 1.01 * peak }))).toEqual([])
  })

  it('is raised for three equal maxima side by side, and not for two', () => {
    const order = Array.from(clean.values).sort((a, b) => b - a)
    const cut = (ceiling: number) => ({ ...clean, values: Array.from(clean.values, value => Math.min(value, ceiling)) })
    expect(flags(inputFor(cut(order[1])))).not.toContain('saturated')
    expect(flags(inputFor(cut(order[2])))).toContain('saturated')
  })

  it('does not look at lines that are not used', () => {
    const used = labels.slice(1)
    expect(flags(inputFor({ ...clean, fullScale: peak }, { usedLabels: used }))).not.toContain('saturated')
  })
})

describe('shift-large', () => {
  it.each([[0.12, false], [-0.12, false], [0.2, true], [-0.2, true]])('for %f nm at a width of 0.3 nm: %s', (shift, raised) => {
    expect(flags(inputFor(draw({ lines: drawnLadder(shift), seed: 2 })))).toEqual(raised ? ['shift-large'] : [])
  })
})

describe('sigma-assumed', () => {
  it('is raised without sigmas and when the residuals are asked, not with sigmas', () => {
    expect(flags(inputFor({ ...clean, sigma: null }))).toContain('sigma-assumed')
    expect(flags(inputFor(clean, { noise: 'from-residuals' }))).toContain('sigma-assumed')
    expect(flags(inputFor(clean))).not.toContain('sigma-assumed')
  })
})

describe('weak-line', () => {
  it('is raised when a used line has a signal-to-noise below 20', () => {
    const noisy = retrieveFromSpectrum(inputFor(draw({ lines: drawnLadder(), sigma: 6, seed: 2 })))
    expect(noisy.weakestSignalToNoise).toBeLessThan(20)
    expect(noisy.flags).toContain('weak-line')
    expect(retrieveFromSpectrum(inputFor(clean)).weakestSignalToNoise).toBeGreaterThan(20)
  })
})
