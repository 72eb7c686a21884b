import { describe, expect, it } from 'vitest'
import type { ResultLine } from '#shared/engine/types'
import { boltzmannSeries } from '~/utils/chart-data/boltzmann'

const line = (over: Partial<ResultLine>): ResultLine => ({
  label: 'a', band: '1-0', termEnergy: 0, wavenumber: 5000, strength: 2, intensity: 100, sigma: 1, model: 100, residual: 0,
  leverage: 0.5, temperatureWithout: null, logRatio: Math.log(50), sigmaLogRatio: 0.01, used: true, ...over,
})

describe('boltzmannSeries', () => {
  it('puts ln(I/w) on energy with the logarithm of the error bar ends', () => {
    const { bands, edge } = boltzmannSeries({ lines: [line({}), line({ label: 'b', termEnergy: 100 })], plotLines: [] })
    const [point] = bands[0]!.points
    expect(point).toMatchObject({ x: 0, y: Math.log(50), low: Math.log(99 / 2), high: Math.log(101 / 2), hollow: false, atEdge: false })
    expect(edge).toBeNull()
  })

  it('keeps a line without logarithm on the edge, below every other mark', () => {
    const { bands, edge } = boltzmannSeries({ lines: [line({}), line({ label: 'b', termEnergy: 100, intensity: -3, sigma: 2 })], plotLines: [] })
    const negative = bands[0]!.points[1]!
    expect(negative.atEdge).toBe(true)
    expect(negative.hollow).toBe(true)
    expect(negative.y).toBe(edge)
    expect(edge).toBeLessThan(bands[0]!.points[0]!.low)
  })

  it('draws a line at three sigma hollow and one above it filled', () => {
    const { bands } = boltzmannSeries({ lines: [line({ intensity: 3, sigma: 1 }), line({ label: 'b', intensity: 3.01, sigma: 1, termEnergy: 100 })], plotLines: [] })
    expect(bands[0]!.points.map(point => point.hollow)).toEqual([true, false])
  })

  it('lets an error bar that reaches zero end on the edge', () => {
    const { bands, edge } = boltzmannSeries({ lines: [line({}), line({ label: 'b', intensity: 1, sigma: 1.5, termEnergy: 100 })], plotLines: [] })
    expect(bands[0]!.points[1]!.low).toBe(edge)
    expect(edge).not.toBeNull()
  })

  it('reads energies far above their spread from the lowest line and says so', () => {
    const { bands, energyTitle } = boltzmannSeries({
      lines: [line({ termEnergy: 13287.18 }), line({ label: 'b', termEnergy: 13387.18 })],
      plotLines: [{ band: '1-0', intercept: 80, slope: -0.0076, energyRange: [13287.18, 13387.18] }],
    })
    expect(bands[0]!.points.map(point => point.x)).toEqual([0, 100])
    expect(energyTitle).toContain('above 13287.18')
    const [start, end] = bands[0]!.fit
    expect(start!.x).toBeCloseTo(-3, 9)
    expect((end!.y - start!.y) / (end!.x - start!.x)).toBeCloseTo(-0.0076, 12)
  })

  it('gives every band its own origin and its own fitted line', () => {
    const { bands } = boltzmannSeries({
      lines: [line({ termEnergy: 10 }), line({ band: '2-1', termEnergy: 500 })],
      plotLines: [{ band: '2-1', intercept: 1, slope: -0.01, energyRange: [500, 500] }],
    })
    expect(bands.map(band => [band.band, band.points[0]!.x, band.fit.length])).toEqual([['1-0', 0, 0], ['2-1', 0, 2]])
  })
})
