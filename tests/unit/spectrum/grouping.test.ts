import { describe, expect, it } from 'vitest'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import { groupLines } from '#shared/engine/spectrum/grouping'
import { draw, drawnLadder, inputFor, ladder, lineAt } from './helpers'

const fwhm = 0.3
const labels = (lines: { label: string }[]) => lines.map(line => line.label)

describe('lines that are measured beside the used ones', () => {
  const used = [lineAt('U1', 1000), lineAt('U2', 1010)]

  it('stand alone, sorted by wavelength, when they are clear of each other', () => {
    expect(labels(groupLines(used, [lineAt('N2', 1012), lineAt('N1', 1005)], fwhm))).toEqual(['U1', 'N1', 'U2', 'N2'])
  })

  it('share an area when they are closer than half a width, measured between components', () => {
    const groups = groupLines(used, [lineAt('A', 1005), lineAt('B', 1005.14), lineAt('C', [1005.6, 1005.27]), lineAt('D', 1006)], fwhm)
    expect(labels(groups)).toEqual(['U1', 'A + B + C', 'D', 'U2'])
    expect(groups[1]).toMatchObject({ band: 'a' })
    expect(groups[1].components).toHaveLength(4)
    expect(groups[1].mixesBands).toBeUndefined()
  })

  it('are left out when they cannot be told from a used line', () => {
    expect(labels(groupLines(used, [lineAt('N', 1000.14), lineAt('M', 1000.16)], fwhm))).toEqual(['U1', 'M', 'U2'])
  })

  it('keep used lines apart, however close', () => {
    expect(labels(groupLines([...used, lineAt('U3', 1000.1)], [], fwhm))).toEqual(['U1', 'U3', 'U2'])
  })

  it('are of no band when they come from two, and stay so when a third line joins', () => {
    const [, group] = groupLines(used, [lineAt('A', 1005, 100, 'a'), lineAt('B', 1005.1, 9000, 'b'), lineAt('C', 1005.2, 100, 'a')], fwhm)
    expect(group).toMatchObject({ label: 'A + B + C', mixesBands: true })
  })
})

describe('an area that lines of two bands share', () => {
  const mixed = [lineAt('N', 1002.5, 0, 'a'), lineAt('M', 1002.6, 9000, 'b')]
  const spectrum = draw({ lines: [...drawnLadder(), { wavelength: 1002.5, area: 60 }, { wavelength: 1002.6, area: 60 }], seed: 4 })

  it.each(['own', 'common'] as const)('is measured, and has neither a model nor a place on the Boltzmann plot (%s scales)', (bandScales) => {
    const result = retrieveFromSpectrum(inputFor(spectrum, { lines: [...ladder, ...mixed], usedLabels: labels(ladder), bandScales }))
    const line = result.lines.find(({ label }) => label === 'N + M')!
    expect(line).toMatchObject({ used: false, model: null, logRatio: null, sigmaLogRatio: null })
    expect(Math.abs(line.intensity - 120) / line.sigma!).toBeLessThan(4)
    expect(result.flags).toEqual([])
    expect(Math.abs(result.temperature!.value - 200) / result.temperature!.uNoise).toBeLessThan(4)
  })

  it('is shared as if the bands were equally bright, each from its own lowest level', () => {
    const [drawn, high] = [{ wavelength: 1002.5, area: 119 }, lineAt('M', 1002.6, 9700, 'b')]
    const faint = [mixed[0], high, lineAt('O', 1012.5, 9000, 'b')]
    const result = retrieveFromSpectrum(inputFor(draw({ lines: [...drawnLadder(), drawn, { wavelength: 1002.6, area: 1 }], seed: 4 }), { lines: [...ladder, ...faint], usedLabels: labels(ladder) }))
    const { chi2, dof } = result.spectrum!.measurement
    // 700 cm-1 above the lowest level of its band M carries under 1 % at 200 K.
    expect(Math.abs(chi2 / dof - 1)).toBeLessThan(0.3)
  })

  it('is modelled when both are of the fitted band', () => {
    const together = [lineAt('N', 1002.5, 60), lineAt('M', 1002.6, 60)]
    const result = retrieveFromSpectrum(inputFor(spectrum, { lines: [...ladder, ...together], usedLabels: labels(ladder) }))
    expect(result.lines.find(({ label }) => label === 'N + M')!.model).toBeGreaterThan(0)
  })
})
