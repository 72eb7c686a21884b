import { describe, expect, it } from 'vitest'
import { nightBounds, nightOf, solarOffsetMs, solarTime } from '#shared/utils/solar-time'

describe('mean solar time', () => {
  it('is UTC on the meridian of Greenwich, and four minutes ahead for each degree east', () => {
    expect([0, 15, -15, 90, 180].map(degrees => solarOffsetMs(degrees) / 3_600_000)).toEqual([0, 1, -1, 6, 12])
    expect(solarTime('2026-01-14T21:40:00.000Z', 9.87)).toBe('2026-01-14T22:19:28.800')
  })

  it('knows that 350 degrees east is ten degrees west', () => {
    expect(solarOffsetMs(350)).toBe(solarOffsetMs(-10))
    expect(solarOffsetMs(359.999)).toBeCloseTo(-240, 3)
  })

  it('is UTC where no longitude is known', () => {
    expect(solarTime('2026-01-14T21:40:00.000Z', null)).toBe('2026-01-14T21:40:00.000')
  })
})

describe('a night', () => {
  it('begins and ends at solar noon', () => {
    const { from, to } = nightBounds('2026-01-14', 170)
    expect([from, to]).toEqual(['2026-01-14T00:40:00.000Z', '2026-01-15T00:40:00.000Z'])
    expect(solarTime(from, 170)).toBe('2026-01-14T12:00:00.000')
  })

  it.each([-179.9, -70.3, 0, 9.87, 170, 350])('holds every instant between its bounds and none beyond, at %s degrees east', (longitude) => {
    const { from, to } = nightBounds('2026-02-28', longitude)
    const shifted = (iso: string, ms: number) => new Date(Date.parse(iso) + ms).toISOString()
    expect([nightOf(from, longitude), nightOf(shifted(to, -1), longitude)]).toEqual(['2026-02-28', '2026-02-28'])
    expect([nightOf(shifted(from, -1), longitude), nightOf(to, longitude)]).toEqual(['2026-02-27', '2026-03-01'])
  })
})
