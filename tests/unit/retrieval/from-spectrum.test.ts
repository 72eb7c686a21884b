import { describe, expect, it } from 'vitest'
import type { RetrievalSettingsInput } from '#shared/schemas/settings'
import { co, fromSpectrum, inputOf, p1, problemsOf } from './helpers'

const settings = { lineList: 'oh-meinel', bands: ['3-1'] }

describe('a spectrum with a list', () => {
  it('uses the band\'s recommended lines and measures those beside them', () => {
    const input = inputOf(fromSpectrum(settings))
    expect(input.usedLabels).toEqual(p1)
    const beside = input.lines.map(line => line.label).slice(4)
    expect(beside).toContain('P2(3)')
    expect(new Set(input.lines.map(line => line.label)).size).toBe(input.lines.length)
    expect(input.neighbours!.length).toBeGreaterThan(0)
    for (const line of [...input.lines.slice(4), ...input.neighbours!]) {
      expect(line.components.some(({ wavenumber }) => 1e7 / wavenumber >= 1520 && 1e7 / wavenumber <= 1560), line.label).toBe(true)
      expect(line.components.every(({ einsteinA }) => einsteinA > 0), line.label).toBe(true)
    }
  })

  it('uses the lines asked for, with the band in the label where there are two', () => {
    expect(inputOf(fromSpectrum({ ...settings, lines: ['P1(2)', 'P2(3)'] })).usedLabels).toEqual(['P1(2)', 'P2(3)'])
    expect(inputOf(fromSpectrum({ ...settings, bands: ['3-1', '4-2'], lines: ['P1(2)'] })).usedLabels).toEqual(['3-1 P1(2)', '4-2 P1(2)'])
  })

  it('needs no band when the list has one', () => {
    const input = inputOf(fromSpectrum({ lineList: 'co-rotation', observable: 'brightness-integral' }, { axisUnit: 'GHz' }, co))
    expect(input.usedLabels).toEqual(co.bands[0].recommendedLines)
  })

  it('gives the other strength sets for the used lines only', () => {
    const { alternatives, lines, strengthSet } = inputOf(fromSpectrum(settings))
    expect([strengthSet, ...alternatives!.map(({ name }) => name)]).toEqual(['brooke2016', 'mies1974', 'hitran', 'theoretical'])
    for (const { einsteinA } of alternatives!) expect(einsteinA.map(rates => rates !== null)).toEqual(lines.map((_, i) => i < 4))
  })

  it('hands the settings and the detector\'s full scale on', () => {
    const given: RetrievalSettingsInput = { shift: 'fixed', continuumOrder: 3, masks: [[1530, 1531]], noise: 'relative', temperatureRange: [100, 300], bandScales: 'common', profile: { fwhm: 0.4 } }
    const input = inputOf(fromSpectrum({ ...settings, ...given }, { axisUnit: 'nm', valueKind: 'photons', fullScale: 60000 }))
    expect(input).toMatchObject({ ...given, profile: { shape: 'gaussian', fwhm: 0.4 }, spectrum: { fullScale: 60000 } })
  })
})

describe('what an intensity is integrated over', () => {
  const axis = (...given: Parameters<typeof fromSpectrum>) => inputOf(fromSpectrum(...given)).integrateOver
  it('follows the axis of the file for emission', () => {
    for (const [axisUnit, expected] of [['nm', 'wavelength'], ['angstrom', 'wavelength'], ['um', 'wavelength'], ['cm-1', 'wavenumber'], ['GHz', 'frequency'], ['Hz', 'frequency']] as const) {
      expect(axis(settings, { axisUnit, valueKind: 'photons' })).toBe(expected)
    }
  })

  it('is fixed by the observable otherwise', () => {
    const about = { axisUnit: 'GHz' } as const
    expect(axis({ ...settings, observable: 'absorption-area' }, about)).toBe('wavenumber')
    expect(axis({ ...settings, observable: 'optical-depth-integral' }, about)).toBe('velocity')
    expect(axis({ ...settings, observable: 'brightness-integral' }, about)).toBe('velocity')
    expect(axis({ ...settings, observable: 'equivalent-width', widthIn: 'wavenumber' }, about)).toBe('wavenumber')
  })
})

describe('a spectrum that cannot be prepared', () => {
  const first = (...given: Parameters<typeof fromSpectrum>) => problemsOf(fromSpectrum(...given))[0]

  it('because photons or energy are not stated, or stated in two ways', () => {
    expect(first(settings, { axisUnit: 'nm', valueKind: null }).path).toBe('valueKind')
    expect(first(settings, { axisUnit: 'nm', valueKind: 'energy' })).toEqual({ path: 'observable', message: 'The spectrum\'s values count energy, the settings read photon-emission: change one of them.' })
    expect(first({ ...settings, observable: 'energy-emission' }).message).toContain('count photons, the settings read energy-emission')
    expect(inputOf(fromSpectrum({ ...settings, observable: 'energy-emission' }, { axisUnit: 'nm', valueKind: 'energy' })).reading).toEqual({ observable: 'energy-emission' })
  })

  it('because of an unknown label, said with its path and the labels most like it', () => {
    const problem = first({ ...settings, lines: ['P1(2)', 'P1(23)'] })
    expect(problem.path).toBe('lines.1')
    expect(problem.message).toMatch(/has a line "P1\(23\)"; near: .*P1\([23]\)/)
  })

  it('because of an unknown or a missing band', () => {
    expect(first({ ...settings, bands: ['3-1', '33-1'] })).toEqual({ path: 'bands.1', message: expect.stringMatching(/no band "33-1"; near: .*3-1/) })
    expect(first({ lineList: 'oh-meinel' })).toEqual({ path: 'bands', message: expect.stringContaining('State the band: oh-meinel has 2-0, 3-1') })
  })

  it('because there is no list, or none of that name', () => {
    expect(first({}, undefined, null)).toEqual({ path: 'lineList', message: 'A spectrum needs a line list that says where the lines stand.' })
    expect(first({ lineList: 'none' }, undefined, null)).toEqual({ path: 'lineList', message: 'There is no line list "none".' })
  })

  it('because the strength set lacks a line', () => {
    expect(first({ ...settings, bands: ['6-2'], strengthSet: 'brooke2016' })).toEqual({ path: 'strengthSet', message: 'The strength set brooke2016 lacks P1(2), P1(3), P1(4), P1(5); complete for these lines: mies1974, theoretical.' })
  })

  it('because the observable is none of a spectrum', () => {
    for (const observable of ['level-population', 'raman-scatter'] as const) expect(first({ ...settings, observable }).path).toBe('observable')
    expect(first({ ...settings, observable: 'equivalent-width' }).path).toBe('widthIn')
  })
})
