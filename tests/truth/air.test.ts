import { describe, expect, it } from 'vitest'
import { airFormulaNames, airIndex, airShift, airToVacuum, vacuumToAir } from '#shared/engine/units/air'

describe('air', () => {
  // Common practice: (n - 1) lambda of standard air, n - 1 about 2.75e-4 at 840 nm and 2.73e-4 above 1500 nm; shifts from memory.
  it.each([[840, 0.231], [1524, 0.417], [1600, 0.437]])('moves a line at %d nm by %f nm', (wavelength, shift) => {
    expect(Math.abs(airShift(wavelength) - shift)).toBeLessThan(0.001)
  })

  it.each(airFormulaNames)('%s goes to vacuum and back within 1e-12', (formula) => {
    for (const wavelength of [200.5, 250, 312.7, 589.3, 840, 1524, 1600, 5000, 20000, 1e6]) {
      expect(Math.abs(airToVacuum(vacuumToAir(wavelength, formula), formula) / wavelength - 1), `${wavelength} nm`).toBeLessThan(1e-12)
      expect(Math.abs(vacuumToAir(airToVacuum(wavelength, formula), formula) / wavelength - 1), `${wavelength} nm`).toBeLessThan(1e-12)
    }
  })

  it('has four formulas that agree within 3e-8 in n from 400 nm to 2000 nm', () => {
    // Common practice, no source: the formulas in use differ by a few parts in 1e8.
    for (const wavelength of [400, 589.3, 840, 1600, 2000]) {
      const indices = airFormulaNames.map(formula => airIndex(wavelength, formula))
      expect(Math.max(...indices) - Math.min(...indices), `${wavelength} nm`).toBeLessThan(3e-8)
    }
  })
})
