import { describe, expect, it } from 'vitest'
import { LineColumns } from '#shared/engine/spectrum/columns'
import { fitShiftAndWidth, solveAt } from '#shared/engine/spectrum/fit'
import { LinearSystem } from '#shared/engine/spectrum/linear-system'
import { ShiftAndWidth } from '#shared/engine/spectrum/nonlinear'
import { pixelsWithin } from '#shared/engine/spectrum/pixels'
import { draw } from './helpers'

const lines = [
  { components: [{ wavelength: 1000, share: 1 }] },
  { components: [{ wavelength: 1003.1, share: 0.7 }, { wavelength: 1003.3, share: 0.3 }] },
]
const drawn = [{ wavelength: 1000.02, area: 100 }, { wavelength: 1003.18, area: 60 }]
const pixels = pixelsWithin(draw({ lines: drawn, step: 0.2, seed: 3 }), 996, 1008, [])

/** The columns spread over all pixels. */
function dense(shift: number, fwhm: number, integrated: boolean, which: 'value' | 'byShift' | 'byLogWidth'): number[][] {
  const columns = new LineColumns(pixels, lines, integrated)
  columns.fill(shift, fwhm)
  columns.fillSlopes()
  return lines.map((_, i) => Array.from({ length: pixels.count }, (_, p) => p >= columns.start[i] && p < columns.end[i] ? columns[which][columns.offset[i] + p - columns.start[i]] : 0))
}

describe.each([[false, 0.5], [true, 0.3], [true, 0.15]])('derivatives of the columns (integrated over pixels: %s, FWHM %f nm)', (integrated, fwhm) => {
  const at = (shift: number, logWidth: number) => dense(shift, fwhm * Math.exp(logWidth), integrated, 'value')
  const h = 1e-5

  it.each(['byShift', 'byLogWidth'] as const)('%s is the central difference of the value', (which) => {
    const [low, high] = which === 'byShift' ? [at(0.03 - h * fwhm, 0), at(0.03 + h * fwhm, 0)] : [at(0.03, -h), at(0.03, h)]
    const step = which === 'byShift' ? 2 * h * fwhm : 2 * h
    const analytic = dense(0.03, fwhm, integrated, which)
    const largest = Math.max(...analytic.flat().map(Math.abs))
    expect(largest).toBeGreaterThan(0)
    analytic.forEach((column, i) => column.forEach((value, p) => {
      expect(Math.abs(value - (high[i][p] - low[i][p]) / step), `line ${i}, pixel ${p}`).toBeLessThan(1e-6 * largest)
    }))
  })
})

it.each([0.3, 0.15])('columns integrated over pixels sum to an area of one (FWHM %f nm)', (fwhm) => {
  for (const column of dense(0.03, fwhm, true, 'value')) expect(column.reduce((sum, value, p) => sum + value * pixels.width[p], 0)).toBeCloseTo(1, 8)
})

describe('shift and width with areas and continuum eliminated', () => {
  const system = () => new LinearSystem(pixels, new LineColumns(pixels, lines, false), [new Float64Array(pixels.count).fill(1)])
  const chi2 = (shift: number, logWidth: number) => {
    const one = system()
    solveAt(one, { shift, logWidth })
    return one.chi2
  }

  it('the gradient is minus half the slope of chi2', () => {
    const [shift, logWidth, h] = [0.06, Math.log(0.4), 1e-5]
    const one = system()
    solveAt(one, { shift, logWidth })
    const reduced = new ShiftAndWidth(one)
    reduced.linearise()
    expect(-(chi2(shift + h, logWidth) - chi2(shift - h, logWidth)) / (4 * h) / reduced.gradient[0]).toBeCloseTo(1, 6)
    expect(-(chi2(shift, logWidth + h) - chi2(shift, logWidth - h)) / (4 * h) / reduced.gradient[1]).toBeCloseTo(1, 6)
  })

  it('the fit ends where neither shift nor width lowers chi2', () => {
    const outcome = fitShiftAndWidth(system(), { shift: 0.1, logWidth: Math.log(0.5) }, { shift: true, width: true }, { shift: 2, width: [0.05, 5] })
    expect(outcome.converged).toBe(true)
    const least = chi2(outcome.shift, outcome.logWidth)
    for (const d of [-1e-3, 1e-3]) {
      expect(chi2(outcome.shift + d, outcome.logWidth)).toBeGreaterThan(least)
      expect(chi2(outcome.shift, outcome.logWidth + d)).toBeGreaterThan(least)
    }
  })
})
