import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import type { MeasuredLine } from '#shared/engine/types'
import { speedOfLight } from '#shared/engine/units/axis'
import { readCatalogue } from './readers/jpl'
import { readHitran } from './readers/hitran'

/** Catalogue intensities as absorption areas, each known to the same part of itself. */
const temperatureOf = (lines: MeasuredLine[]) => retrieveFromLines({ reading: { observable: 'absorption-area' }, lines, noise: 'relative', strengthSet: null })

describe('catalogue intensities read with the absorption model', () => {
  it('HITRAN 16OH, 257 records at 1.51-1.70 um, give back 296 K to 0.005 K', () => {
    // HITRAN states S at its reference temperature 296 K (Rothman et al. 1998, JQSRT 60, 665).
    const records = readHitran('airglow/hitran_oh_1510_1700nm.txt')
    const result = temperatureOf(records.map(({ wavenumber, intensity, einsteinA, energyLower, gUpper, gLower }, i) => ({
      label: `${i}`, band: 'OH', intensity, sigma: 0.01 * intensity, used: true,
      components: [{ wavenumber, termUpper: energyLower + wavenumber, termLower: energyLower, gUpper, gLower, einsteinA }],
    })))
    expect(records).toHaveLength(257)
    expect(Math.abs(result.temperature!.value - 296)).toBeLessThan(0.005)
  })

  it('JPL N2O (tag 44004) gives back 300 K to 0.01 K', () => {
    // lg I is stated at 300 K (Pickett et al. 1998, JQSRT 60, 883). The file has no A; for a linear molecule A g_u ~ nu^3 J (textbook formula).
    const lines = readCatalogue('catalogues/c044004.cat')
    const result = temperatureOf(lines.map(({ frequencyMHz, lgIntensity, energyLower, gUpper }, i) => {
      const J = (gUpper - 1) / 2
      const wavenumber = frequencyMHz * 1e4 / speedOfLight
      const intensity = 10 ** lgIntensity
      return {
        label: `${i}`, band: 'N2O', intensity, sigma: 0.01 * intensity, used: true,
        components: [{ wavenumber, termUpper: energyLower + wavenumber, termLower: energyLower, gUpper, gLower: gUpper - 2, einsteinA: wavenumber ** 3 * J / gUpper }],
      }
    }))
    expect(lines).toHaveLength(104)
    expect(Math.abs(result.temperature!.value - 300)).toBeLessThan(0.01)
  })
})
