import { readFileSync } from 'node:fs'
import { beforeAll, describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { loadLineList } from '#shared/line-lists/index'
import { lineTableSchema } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import type { RetrievalResult } from '#shared/engine/types'
import { lineKey } from '~/utils/chart-data/line-key'
import { recomputeInput, switchableLines } from '~/utils/result/recompute'
import { tasks } from '~/workers/tasks'

// A real night-sky sum; see tests/truth/spectra/SOURCE.md.
const file = new File([readFileSync('tests/truth/spectra/nearir_sky_b.fits')], 'nearir_sky_b.fits')
const about = { axisUnit: 'angstrom', medium: 'vacuum', valueKind: 'photons' } as const
const settingsFor = (lines: string[]) => settingsSchema.parse({ lineList: 'oh-meinel', bands: ['4-2'], lines, noise: 'from-residuals' })
const all = ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)']

let list: LineList
const fit = async (lines: string[]): Promise<RetrievalResult> => {
  const answer = await tasks.fitSpectrum({ file, about, settings: settingsFor(lines), lineList: list })
  if (!answer.result) throw new Error(answer.problems[0]?.message)
  return answer.result
}
const keys = (lines: string[]) => new Set(lines.map(label => lineKey({ band: '4-2', label })))
beforeAll(async () => { list = (await loadLineList('oh-meinel'))! })

describe('recomputing a stored measurement of a spectrum', () => {
  it('gives the stored temperature and uncertainty for the stored lines', async () => {
    const result = await fit(all)
    const again = retrieveFromLines(recomputeInput({ settings: settingsFor(all), lineTable: null, result }, list, keys(all))!)
    expect(again.temperature!.value / result.temperature!.value).toBeCloseTo(1, 9)
    expect(again.temperature!.uNoise / result.temperature!.uNoise).toBeCloseTo(1, 6)
    expect(again.strengthSets.map(set => set.name)).toEqual(result.strengthSets.map(set => set.name))
  })

  it('gives what the service finds for fewer lines, within a tenth of the noise', async () => {
    const three = all.slice(0, 3)
    const result = await fit(all)
    const here = retrieveFromLines(recomputeInput({ settings: settingsFor(all), lineTable: null, result }, list, keys(three))!)
    const there = await fit(three)
    expect(Math.abs(here.temperature!.value - there.temperature!.value)).toBeLessThan(0.1 * there.temperature!.uNoise)
    expect(here.temperature!.value).not.toBeCloseTo(result.temperature!.value, 2)
  })

  it('offers the measured lines of the band and none of other bands', async () => {
    const offered = switchableLines({ result: await fit(all) })
    expect(offered.map(line => line.label)).toEqual(expect.arrayContaining(all))
    expect(new Set(offered.map(line => line.band))).toEqual(new Set(['4-2']))
  })

  it('has no answer when a line that is switched on is not in the list', async () => {
    const result = await fit(all)
    expect(recomputeInput({ settings: settingsFor(all), lineTable: null, result }, list, keys([...all, 'Z9(9)']))).toBeNull()
    expect(recomputeInput({ settings: settingsFor(all), lineTable: null, result }, null, keys(all))).toBeNull()
  })
})

describe('recomputing a line table', () => {
  it('gives the same as a table of the lines that are on', () => {
    const lines = [['P1(2)', 812.4], ['P1(3)', 846.1], ['P1(4)', 541], ['P1(5)', 246.8]].map(([label, intensity]) => ({ label, intensity, sigma: 8 }))
    const table = lineTableSchema.parse({ observable: 'photon-emission', lineList: 'oh-meinel', band: '3-1', lines })
    const settings = settingsSchema.parse({})
    const on = new Set(['P1(2)', 'P1(3)', 'P1(4)'].map(label => lineKey({ band: '3-1', label })))
    const here = retrieveFromLines(recomputeInput({ settings, lineTable: table, result: null }, list, on)!)
    const alone = prepareFromTable({ table: { ...table, lines: table.lines.slice(0, 3) }, settings, lineList: list })
    if (!('input' in alone)) throw new Error('The short table could not be prepared.')
    expect(here.temperature!.value).toBeCloseTo(retrieveFromLines(alone.input).temperature!.value, 9)
  })
})
