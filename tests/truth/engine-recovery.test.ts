import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { nameOf, readings, rotorLines, secondRadiation, syntheticInput } from '../unit/engine/helpers/tables'

/** Truth: the table is made from the model's formulas, written out a second time in the helper. */
const temperatures = [3, 7.5, 20, 60, 187.4, 296, 900, 2400, 5000]
const rotors = [{ name: 'CO-like', B: 1.93, count: 8 }, { name: 'hydride-like', B: 17, count: 6 }, { name: 'heavy', B: 0.05, count: 30 }]

describe.each(readings.map(reading => [nameOf(reading), reading] as const))('noise-free lines of %s', (_, reading) => {
  it.each(rotors)('give back the temperature to 1e-9 for a $name rotor', ({ B, count }) => {
    for (const temperature of temperatures) {
      const lines = rotorLines(count, B)
      const reach = secondRadiation * (B * count * (count + 1)) / temperature
      if (reach >= 700) continue
      const result = retrieveFromLines(syntheticInput({ reading, temperature, lines, scale: 3.7 }))
      expect(result.reason, `${temperature} K`).toBeUndefined()
      expect(Math.abs(result.temperature!.value / temperature - 1), `${temperature} K`).toBeLessThan(1e-9)
    }
  })

  it('stay exact when every line has two components', () => {
    const lines = rotorLines(6, 8).map(line => ({ ...line, components: line.components.flatMap(c => [c, { ...c, wavenumber: c.wavenumber + 0.02, termUpper: c.termUpper + 0.02, einsteinA: 0.97 * c.einsteinA }]) }))
    const result = retrieveFromLines(syntheticInput({ reading, temperature: 187.4, lines }))
    expect(Math.abs(result.temperature!.value / 187.4 - 1)).toBeLessThan(1e-9)
  })
})

it('recovers a temperature below the background, where lines are dips', () => {
  const reading = { observable: 'brightness-integral', backgroundTemperature: 30 } as const
  for (const temperature of [4, 9, 20, 29, 31, 80]) {
    const result = retrieveFromLines(syntheticInput({ reading, temperature, lines: rotorLines(6, 1.93) }))
    expect(result.reason, `${temperature} K`).toBeUndefined()
    expect(Math.abs(result.temperature!.value / temperature - 1), `${temperature} K`).toBeLessThan(1e-9)
  }
})
