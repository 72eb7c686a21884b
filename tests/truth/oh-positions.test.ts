import { expect, it } from 'vitest'
import { vacuumToAir } from '#shared/engine/units/air'
import { loadLineList } from '#shared/line-lists/index'
import type { LineList } from '#shared/types/line-list'
import { entryAt, readOsterbrock, readRousselot } from './readers/sky-lines'

const list = await loadLineList('oh-meinel') as LineList

/** Component of a list line by branch, lower J and parity of the lower level. */
function component(band: string, branch: string, J: number, parity: string) {
  // Labels count N" = J" - 1/2 in F1 and J" + 1/2 in F2.
  const label = `${branch}(${branch.endsWith('1') ? J - 0.5 : J + 0.5})`
  return list.bands.find(({ id }) => id === band)?.lines.find(line => line.label === label)?.components.find(one => one.component === parity)
}

// Osterbrock et al. 1996, PASP 108, 277; 1997, PASP 109, 614 (CDS III/211): air wavelengths from the laboratory work of Abrams et al. 1994.
it.each(['6-2', '7-3', '8-3', '5-1', '9-4'])('P lines of %s to J 5.5 stand within 0.02 angstrom of the Keck atlas', (band) => {
  const offs = readOsterbrock().filter(line => line.band === band && line.branch.startsWith('P') && line.J <= 5.5).flatMap(({ branch, J, parity, airAngstrom }) => {
    const found = component(band, branch, J, parity)
    return found ? [10 * vacuumToAir(1e7 / found.wavenumber, 'edlen1966') - airAngstrom] : []
  })
  expect(offs.length).toBeGreaterThanOrEqual(8)
  expect(Math.max(...offs.map(Math.abs))).toBeLessThan(0.02)
})

// Rousselot et al. 2000, A&A 354, 1134: vacuum wavelengths, "accuracy of the order of a few hundredths of angstroms".
it.each(['3-1', '4-2', '5-3', '6-2', '8-3'])('P1 lines of %s stand within 0.02 angstrom of the list of Rousselot et al.', (band) => {
  const list = readRousselot()
  for (const J of [2.5, 3.5, 4.5, 5.5]) {
    for (const parity of ['e', 'f']) {
      const place = 1e8 / component(band, 'P1', J, parity)!.wavenumber
      expect(Math.abs(entryAt(list, place).vacuumAngstrom - place), `J ${J} ${parity}`).toBeLessThan(0.02)
    }
  }
})
