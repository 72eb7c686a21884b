import { describe, expect, it } from 'vitest'
import { C2 } from '#shared/engine/constants'
import { partitionFromLevels } from '#shared/engine/partition/partition'
import { speedOfLight } from '#shared/engine/units/axis'
import { loadLineList } from '#shared/line-lists/index'
import type { LineList } from '#shared/types/line-list'
import { partitionTemperatures, readCatalogue, readLgPartition } from './readers/jpl'
import { readLamda } from './readers/lamda'

const list = await loadLineList('co-rotation') as LineList
/** Component of J -> J - 1. */
const component = (J: number) => list.bands[0].lines.find(line => line.label === `${J}-${J - 1}`)!.components[0]
const megahertz = (wavenumber: number) => wavenumber * speedOfLight / 1e4
const levels = list.levels!

describe('CO rotation against LAMDA co.dat (Schoeier et al. 2005, A&A 432, 369)', () => {
  const lamda = readLamda('catalogues/co.dat')

  it('covers the same 41 levels and 40 lines', () => {
    expect([lamda.levels.length, levels.length, lamda.lines.length, list.bands[0].lines.length]).toEqual([41, 41, 40, 40])
  })

  it('stands within 0.01 MHz to J 10 and 0.06 MHz to J 40', () => {
    for (const { upper, frequencyGHz } of lamda.lines) {
      expect(Math.abs(megahertz(component(upper).wavenumber) - 1000 * frequencyGHz), `J ${upper}`).toBeLessThan(upper <= 10 ? 0.01 : 0.06)
    }
  })

  it('has the same energies to 6e-5 cm-1 and the same degeneracies', () => {
    // The file adds its frequencies to lower energies of four decimals: it carries that rounding.
    lamda.levels.forEach(({ energy, degeneracy }, J) => {
      expect(Math.abs(levels[J].energy - energy), `J ${J}`).toBeLessThan(6e-5)
      expect(levels[J].degeneracy, `J ${J}`).toBe(degeneracy)
      if (J > 0) expect(Math.abs(component(J).termUpper - energy), `J ${J}`).toBeLessThan(6e-5)
    })
  })

  it('has the same A within 0.11 % to J 20 and 0.7 % to J 40', () => {
    for (const { upper, einsteinA } of lamda.lines) {
      expect(Math.abs(component(upper).strengths.cdms / einsteinA - 1), `J ${upper}`).toBeLessThan(upper <= 20 ? 0.0011 : 0.007)
    }
  })
})

describe('CO rotation against the JPL catalogue (tag 28001, Pickett et al. 1998, JQSRT 60, 883)', () => {
  const lines = readCatalogue('catalogues/jpl_co_first_lines.txt')

  it('has the first lines in their place, with the printed lower energy and degeneracy', () => {
    expect(lines.length).toBeGreaterThanOrEqual(4)
    lines.forEach(({ frequencyMHz, energyLower, gUpper }, i) => {
      const { wavenumber, termLower, gUpper: g } = component(i + 1)
      expect(Math.abs(megahertz(wavenumber) - frequencyMHz), `J ${i + 1}`).toBeLessThan(0.01)
      expect(Math.abs(termLower - energyLower), `J ${i + 1}`).toBeLessThan(6e-5)
      expect(g).toBe(gUpper)
    })
  })

  it('sums to the catalogue\'s Q within 2e-4 in lg Q at its seven temperatures', () => {
    const printed = readLgPartition('catalogues/jpl_partition_functions.cat', 28001)
    partitionTemperatures.forEach((temperature, i) => {
      const { value, flags } = partitionFromLevels(levels, temperature)
      expect(Math.abs(Math.log10(value!) - printed[i]), `${temperature} K`).toBeLessThan(2e-4)
      expect(flags).toEqual([])
    })
  })

  it('gives the catalogue\'s intensities at 300 K to 1 %', () => {
    // Pickett et al. 1998, eq. 9: A = I nu^2 (Q / g_u) (e^-El/kT - e^-Eu/kT)^-1 2.7964e-16, nu in MHz, I in nm^2 MHz
    const Q = partitionFromLevels(levels, 300).value!
    lines.forEach(({ lgIntensity }, i) => {
      const { wavenumber, termLower, termUpper, gUpper, strengths } = component(i + 1)
      const populations = Math.exp(-C2 * termLower / 300) - Math.exp(-C2 * termUpper / 300)
      const intensity = strengths.cdms * gUpper * populations / (2.7964e-16 * megahertz(wavenumber) ** 2 * Q)
      expect(Math.abs(intensity / 10 ** lgIntensity - 1), `J ${i + 1}`).toBeLessThan(0.01)
    })
  })
})

describe('a sum that ends at J 40', () => {
  // B, D, H of CO from memory (MHz), checked by the positions above; the sum to J 150 is complete at 2000 K.
  const energy = (J: number) => {
    const N = J * (J + 1)
    return (57635.968019 * N - 0.18350489 * N ** 2 + 1.7168e-7 * N ** 3) / (speedOfLight / 1e4)
  }
  const complete = (temperature: number) => Array.from({ length: 151 }, (_, J) => (2 * J + 1) * Math.exp(-C2 * energy(J) / temperature)).reduce((a, b) => a + b, 0)

  it.each([[1000, 0.990], [2000, 0.900]])('holds at %d K %f of the whole', (temperature, part) => {
    const { value, held } = partitionFromLevels(levels, temperature)
    expect(value! / complete(temperature)).toBeCloseTo(part, 3)
    expect(held).toBeCloseTo(part, 2)
  })

  it('is called truncated where more than 1 % is missing, and not before', () => {
    expect(partitionFromLevels(levels, 900).flags).toEqual([])
    expect(partitionFromLevels(levels, 2000).flags).toEqual(['q-truncated'])
  })
})
