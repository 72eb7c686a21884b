import { describe, expect, it } from 'vitest'
import { C2 } from '#shared/engine/constants'
import { partitionFromLevels, partitionFromTable } from '#shared/engine/partition/partition'

const rotor = (B: number, top: number) => Array.from({ length: top + 1 }, (_, J) => ({ energy: B * J * (J + 1), degeneracy: 2 * J + 1 }))

describe('Q by direct sum', () => {
  it('of two levels is their Boltzmann sum', () => {
    const T = 150
    const { value } = partitionFromLevels([{ energy: 0, degeneracy: 2 }, { energy: 100, degeneracy: 4 }], T)
    expect(value).toBeCloseTo(2 + 4 * Math.exp(-C2 * 100 / T), 12)
  })

  it('counts energies from the list\'s zero, also when its lowest level is not there', () => {
    const raised = partitionFromLevels([{ energy: 500, degeneracy: 1 }, { energy: 600, degeneracy: 3 }], 300).value!
    const low = partitionFromLevels([{ energy: 0, degeneracy: 1 }, { energy: 100, degeneracy: 3 }], 300).value!
    expect(raised / low).toBeCloseTo(Math.exp(-C2 * 500 / 300), 12)
  })

  it('of a rotor approaches T / (C2 B) + 1/3 + C2 B / (15 T)', () => {
    // Mulholland 1928, Proc. Camb. Phil. Soc. 24, 280 (the expansion; named from memory).
    const q = C2 * 1.93 / 300
    expect(partitionFromLevels(rotor(1.93, 80), 300).value).toBeCloseTo(1 / q + 1 / 3 + q / 15, 4)
  })

  it('does not depend on the order of the levels', () => {
    const levels = rotor(2, 30)
    const turned = partitionFromLevels([...levels].reverse(), 700)
    expect(turned.value! / partitionFromLevels(levels, 700).value!).toBeCloseTo(1, 13)
    expect(turned.held).toBeCloseTo(partitionFromLevels(levels, 700).held!, 12)
  })

  it.each([10, 15, 20, 30])('estimates the part that levels to J %d hold within three hundredths, and is flagged when more than one is missing', (top) => {
    for (const temperature of [100, 300, 600, 1000, 1500]) {
      const { value, held, flags } = partitionFromLevels(rotor(1.93, top), temperature)
      const whole = partitionFromLevels(rotor(1.93, 200), temperature).value!
      const missing = 1 - value! / whole
      expect(Math.abs(1 - held! - missing), `${temperature} K`).toBeLessThan(0.03)
      if (missing > 0.02) expect(flags, `${temperature} K`).toEqual(['q-truncated'])
      if (missing < 0.005) expect(flags, `${temperature} K`).toEqual([])
    }
  })

  it('cannot be said without levels or without a temperature', () => {
    for (const [levels, temperature] of [[[], 300], [rotor(2, 3), 0], [rotor(2, 3), -5], [rotor(2, 3), Number.NaN], [rotor(2, 3), Infinity]] as const) {
      expect(partitionFromLevels(levels, temperature)).toEqual({ value: null, held: null, flags: [] })
    }
  })
})

describe('Q from a table', () => {
  const temperature = [10, 30, 100, 300]
  const table = { temperature, value: temperature.map(T => 0.4 * T ** 1.5) }

  it('follows a power law exactly between its points and at them', () => {
    for (const T of [10, 17, 30, 99, 250, 300]) {
      const { value, flags } = partitionFromTable(table, T)
      expect(value! / (0.4 * T ** 1.5)).toBeCloseTo(1, 12)
      expect(flags).toEqual([])
    }
  })

  it('goes on beyond its ends and says so', () => {
    for (const T of [5, 600]) {
      const { value, flags } = partitionFromTable(table, T)
      expect(value! / (0.4 * T ** 1.5)).toBeCloseTo(1, 12)
      expect(flags).toEqual(['q-extrapolated'])
    }
  })

  it('cannot be said from less than two points, columns of different length or no temperature', () => {
    const none = { value: null, held: null, flags: [] }
    expect(partitionFromTable({ temperature: [10], value: [1] }, 10)).toEqual(none)
    expect(partitionFromTable({ temperature: [10, 20], value: [1] }, 10)).toEqual(none)
    expect(partitionFromTable(table, 0)).toEqual(none)
    expect(partitionFromTable(table, Number.NaN)).toEqual(none)
  })
})
