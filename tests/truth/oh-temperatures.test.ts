import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { loadLineList } from '#shared/line-lists/index'
import { lineTableSchema } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import type { LineList } from '#shared/types/line-list'
import { prepareFromTable } from '#shared/utils/retrieval'
import { entryAt, readRousselot } from './readers/sky-lines'

const lineList = await loadLineList('oh-meinel') as LineList
const sky = readRousselot()
const labels = ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)']

/** Flux of both Lambda components of a line, found by their places. */
function flux(band: string, label: string): number {
  const line = lineList.bands.find(({ id }) => id === band)!.lines.find(one => one.label === label)!
  return line.components.reduce((sum, { wavenumber }) => sum + entryAt(sky, 1e8 / wavenumber).flux, 0)
}

function temperature(band: string, strengthSet: string): number {
  const lines = labels.map((label) => {
    const intensity = flux(band, label)
    return { label, intensity, sigma: 0.01 * intensity }
  })
  const table = lineTableSchema.parse({ observable: 'photon-emission', lineList: 'oh-meinel', band, strengthSet, lines })
  const prepared = prepareFromTable({ table, settings: settingsSchema.parse({}), lineList })
  if ('problem' in prepared) throw new Error(JSON.stringify(prepared.problem))
  return retrieveFromLines(prepared.input).temperature!.value
}

/** Rousselot et al. 2000, A&A 354, 1134: fluxes computed at 190 K rotational temperature with the A of Mies 1974. */
describe('the OH list of Rousselot et al. 2000, P1(2) to P1(5)', () => {
  it.each(['3-1', '4-2', '5-3', '6-2', '8-3'])('%s gives back its 190 K with mies1974, which was taken from it', (band) => {
    expect(Math.abs(temperature(band, 'mies1974') - 190)).toBeLessThan(0.01)
  })

  // The expected values are own computation from the published A values and fluxes (numbers, no published temperature).
  it('reads 189.0 +- 0.1 K in 3-1 with hitran', () => {
    expect(Math.abs(temperature('3-1', 'hitran') - 189)).toBeLessThan(0.1)
  })

  it.each(['3-1', '4-2', '5-3'])('reads 187.8 +- 0.4 K in %s with brooke2016', (band) => {
    expect(Math.abs(temperature(band, 'brooke2016') - 187.8)).toBeLessThan(0.4)
  })
})
