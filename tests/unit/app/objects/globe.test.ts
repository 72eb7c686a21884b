import { describe, expect, it } from 'vitest'
import { globeOf, onGlobe } from '~/utils/objects/globe'

describe('the globe', () => {
  const above = { latitude: 0, longitude: 10 }
  it('has the place below us at its middle, the poles at its ends and the far side hidden', () => {
    expect(onGlobe(0, 10, above)).toEqual({ x: 0, y: -0 })
    expect(onGlobe(90, 10, above)!.y).toBeCloseTo(-1, 12)
    expect(onGlobe(0, 99, above)!.x).toBeCloseTo(1, 3)
    expect(onGlobe(0, 191, above)).toBeNull()
  })

  it('shows north above and east to the right', () => {
    const north = onGlobe(20, 10, above)!
    const east = onGlobe(0, 30, above)!
    expect([north.y < 0, Math.abs(north.x) < 1e-12, east.x > 0]).toEqual([true, true, true])
  })

  it.each([[61.42, 9.87], [-31.2, 342.5], [90, 0], [-90, 180], [0, -180]])('shows the station at %s, %s within the disc', (latitude, longitude) => {
    const { place, grid, equator } = globeOf({ latitude, longitude })
    expect(Math.hypot(place.x, place.y)).toBeLessThanOrEqual(1)
    expect([grid.startsWith('M'), equator.startsWith('M')]).toEqual([true, true])
    for (const text of [grid, equator]) for (const [, x, y] of text.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)) expect(Math.hypot(Number(x), Number(y))).toBeLessThanOrEqual(1.002)
  })
})
