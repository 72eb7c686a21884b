import { describe, expect, it } from 'vitest'
import { lineListSummaries, loadLineList } from '#shared/line-lists/index'
import type { LineList } from '#shared/types/line-list'

const lists = async () => Promise.all(lineListSummaries.map(async ({ id }) => (await loadLineList(id)) as LineList))

describe('built-in line lists', () => {
  it('are named in the index exactly as they load', async () => {
    for (const summary of lineListSummaries) {
      const list = await loadLineList(summary.id)
      expect(list).toMatchObject({ id: summary.id, version: summary.version, strengthSets: summary.strengthSets })
      expect(list?.bands.map(band => [band.id, band.lines.length])).toEqual(summary.bands.map(band => [band.id, band.lineCount]))
    }
  })

  it('answer null for an unknown id, also for names every object has', async () => {
    expect(await loadLineList('no-such-list')).toBeNull()
    expect(await loadLineList('constructor')).toBeNull()
  })

  it('hold only finite, positive numbers and terms that differ by the wavenumber', async () => {
    for (const list of await lists()) {
      for (const component of list.bands.flatMap(band => band.lines).flatMap(line => line.components)) {
        expect(component.wavenumber).toBeGreaterThan(0)
        expect(Math.abs(component.termUpper - component.termLower - component.wavenumber)).toBeLessThan(2e-4)
        expect(component.gUpper * component.gLower).toBeGreaterThan(0)
        for (const strength of Object.values(component.strengths)) expect(strength).toBeGreaterThan(0)
      }
    }
  })

  it('know every recommended line, with a complete set for it', async () => {
    for (const list of await lists()) {
      for (const band of list.bands) {
        const chosen = band.recommendedLines.map(label => band.lines.find(line => line.label === label))
        expect(chosen.every(line => line !== undefined), band.id).toBe(true)
        const complete = list.strengthSets.some(set => chosen.every(line => line?.components.every(component => set.name in component.strengths)))
        expect(complete, band.id).toBe(true)
      }
    }
  })

  it('use each label once in a band', async () => {
    for (const list of await lists()) for (const band of list.bands) expect(new Set(band.lines.map(line => line.label)).size).toBe(band.lines.length)
  })

  it('name the upper vibrational level beside every OH band', async () => {
    const list = await loadLineList('oh-meinel')
    expect(list?.bands).toHaveLength(30)
    for (const band of list?.bands ?? []) expect(band.caution).toContain(`v'=${band.id.split('-')[0]}`)
  })
})
