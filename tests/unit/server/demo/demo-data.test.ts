import { describe, expect, it } from 'vitest'
import { readSpectrum } from '#shared/formats/read-spectrum'
import { vacuumToAir } from '#shared/engine/units/air'
import { nightTemperature, nightTime } from '../../../../docker-free-scripts/demo/calendar.mjs'
import { cloudTable } from '../../../../docker-free-scripts/demo/cloud-table.mjs'
import { nightSpectrum } from '../../../../docker-free-scripts/demo/night-spectrum.mjs'
import { airOf } from '../../../../docker-free-scripts/demo/physics.mjs'
import { lineTableSchema } from '#shared/schemas/line-table'

const night = { band: '4-2', medium: 'air', temperature: 200, seed: 5, head: ['Invented.'] }

describe('the invented demo data', () => {
  it('are the same bytes whenever they are made, so that a second run adds nothing', () => {
    expect(nightSpectrum(night)).toBe(nightSpectrum(night))
    expect(nightSpectrum({ ...night, seed: 6 })).not.toBe(nightSpectrum(night))
    expect(cloudTable({ name: 'a', temperature: 12, seed: 1, observedAt: '2025-11-01T00:00:00.000Z' })).toEqual(cloudTable({ name: 'a', temperature: 12, seed: 1, observedAt: '2025-11-01T00:00:00.000Z' }))
  })

  it('are read as 1024 pixels with a sigma each', () => {
    const outcome = readSpectrum(new TextEncoder().encode(nightSpectrum(night)), 'night.csv', { axisUnit: 'nm', medium: 'air', valueKind: 'photons', columns: { axis: 0, values: 1, sigma: 2 } })
    expect(outcome).toMatchObject({ ok: true, missing: [] })
    if (outcome.ok) expect([outcome.spectrum.axis.length, outcome.spectrum.sigma?.every(sigma => sigma > 0)]).toEqual([1024, true])
  })

  it('use the same refraction of air as the engine', () => {
    for (const wavelength of [500, 840, 1524, 1600]) expect(airOf(wavelength)).toBeCloseTo(vacuumToAir(wavelength, 'ciddor1996'), 6)
  })

  it('are line tables that the service takes, over winter temperatures that nature allows', () => {
    expect(lineTableSchema.safeParse(cloudTable({ name: 'a', temperature: 8, seed: 1, observedAt: nightTime(0).toISOString() })).success).toBe(true)
    expect(nightTime(59).toISOString()).toBe('2025-12-30T22:30:00.000Z')
    for (let index = 0; index < 60; index++) expect(Math.abs(nightTemperature(index, index % 2) - 200)).toBeLessThan(25)
  })
})
