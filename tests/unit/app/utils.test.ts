import { describe, expect, it } from 'vitest'
import type { LineListBand } from '#shared/types/line-list'
import type { RetrievalRow } from '#shared/types/retrieval'
import { ApiError, toApiError } from '~/utils/api-error'
import { toCsv } from '~/utils/csv'
import { dayTicks } from '~/utils/day-ticks'
import { envelopeStrokes, rotorEnvelope } from '~/utils/envelope'
import { lineListRows } from '~/utils/line-list-rows'
import { nightStrip } from '~/utils/night-strip'
import { emptyView, exportAddress, fromRoute, toQuery, toRoute } from '~/utils/retrieval-view'
import { safePath } from '~/utils/safe-path'
import { seriesSummary, stationSeries } from '~/utils/series'
import { placeOn, temperatureScale } from '~/utils/temperature-scale'
import { nightOf } from '#shared/utils/solar-time'

const row = (change: Partial<RetrievalRow>): RetrievalRow => ({
  id: 'r', name: 'night', campaign: { slug: 'ridge', title: 'Ridge' }, batchId: 'b', owner: 'A', station: 'ridge', instrument: null, recipe: null, band: '3-1',
  observedAt: '2026-01-14T21:40:00.000Z', createdAt: '2026-01-15T06:00:00.000Z', finishedAt: null, revision: 1, phase: 'COMPLETED', progress: 1, reason: null,
  temperature: 190, uNoise: 2, uSystematic: null, strengthSet: 'brooke2016', flags: [], verdict: null, ...change,
})

describe('safePath', () => {
  const origin = 'http://127.0.0.1:4310'
  it('keeps a path of ours with its query', () => expect(safePath('/retrievals?phase=ERROR', origin)).toBe('/retrievals?phase=ERROR'))
  it.each(['https://elsewhere.example/', '//elsewhere.example/x', '/\\elsewhere.example', 'javascript:alert(1)', '/sign-in?callbackUrl=/', '', undefined])('goes to the desk instead of %s', (wanted) => {
    expect(safePath(wanted, origin)).toBe('/')
  })
})

describe('toApiError', () => {
  it('reads our error body with its fields', () => {
    const error = toApiError({ statusCode: 422, data: { error: { code: 'validation_failed', message: 'A name is missing.', fields: [{ path: 'name', message: 'Say it.' }] } } })
    expect([error.code, error.message, error.fieldMessage('name'), error.statusCode]).toEqual(['validation_failed', 'A name is missing.', 'Say it.', 422])
  })
  it('survives the way through the payload of a page', () => {
    const sent = new ApiError('not_found', 'There is no such campaign.', 404)
    const received = toApiError(JSON.parse(JSON.stringify({ statusCode: sent.statusCode, message: sent.message, data: sent.data })))
    expect([received.code, received.message, received.statusCode]).toEqual(['not_found', 'There is no such campaign.', 404])
  })
  it('tells a server that cannot be reached from one that refuses', () => {
    expect(toApiError(new TypeError('fetch failed')).code).toBe('unreachable')
    expect(toApiError({ statusCode: 502 }).code).toBe('internal')
  })
})

describe('toCsv', () => {
  it('quotes commas and quotes, ends lines by CRLF and leaves empty what is not known', () => {
    expect(toCsv(['a', 'b'], [['x, "y"', null], [1.5, -2]])).toBe('a,b\r\n"x, ""y""",\r\n1.5,-2\r\n')
  })
  it('defuses a text that a spreadsheet would run', () => expect(toCsv(['a'], [['=1+1']])).toBe('a\r\n\'=1+1\r\n'))
})

describe('the view of the retrievals table', () => {
  it('comes back from the address as it went in', () => {
    const view = { ...emptyView, campaign: 'ridge', phase: 'ERROR' as const, from: '2026-01-01', limit: 100, sort: 'temperature' as const }
    expect(fromRoute(toRoute(view))).toEqual(view)
  })
  it('writes nothing of the empty view into the address', () => expect(toRoute(emptyView)).toEqual({}))
  it('takes the last day as a whole, also over the end of a year', () => {
    expect(toQuery({ ...emptyView, from: '2025-12-31', to: '2025-12-31' })).toMatchObject({ from: '2025-12-31T00:00:00.000Z', to: '2026-01-01T00:00:00.000Z' })
  })
  it('exports the filter and the order, not the page', () => {
    const query = new URL(exportAddress({ ...emptyView, q: 'a&b', cursor: 'abc' }), 'http://x').searchParams
    expect([query.get('q'), query.get('format'), query.get('cursor'), query.get('limit')]).toEqual(['a&b', 'csv', null, null])
  })
})

describe('nights', () => {
  it('run from noon to noon of the station, east and west', () => {
    expect(nightOf('2026-01-15T02:00:00.000Z', 0)).toBe('2026-01-14')
    // 150 degrees east is ten hours ahead: 02:00 UTC is noon there, and the next night begins.
    expect(nightOf('2026-01-15T02:00:00.000Z', 150)).toBe('2026-01-15')
    expect(nightOf('2026-01-15T08:00:00.000Z', -120)).toBe('2026-01-14')
  })
  it('without anything stay in the strip as gaps', () => {
    const [ridge] = nightStrip([row({}), row({ observedAt: '2026-01-16T21:00:00.000Z', phase: 'ERROR' })], [{ name: 'ridge', longitude: 0 }])
    expect(ridge!.nights.map(cell => [cell.night, cell.completed, cell.failed])).toEqual([['2026-01-14', 1, 0], ['2026-01-15', 0, 0], ['2026-01-16', 0, 1]])
  })
})

describe('stationSeries', () => {
  const rows = [row({ observedAt: '2026-01-16T00:00:00.000Z', temperature: 200 }), row({}), row({ station: 'point', temperature: 180 }), row({ temperature: null }), row({ observedAt: null })]
  it('gives each station its points in time order and leaves out what cannot stand in it', () => {
    expect(stationSeries(rows).map(({ station, points }) => [station, points.map(point => point.y)])).toEqual([['point', [180]], ['ridge', [190, 200]]])
  })
  it('is told in words with its unit', () => {
    expect(seriesSummary(stationSeries(rows))).toContain('ridge: 2 temperatures from 2026-01-14 to 2026-01-16, mean 195.0 K')
  })
})

describe('rotorEnvelope', () => {
  it('is tallest at the level nearest to sqrt(kT/2B) - 1/2', () => {
    // Closed form of the maximum of (2J+1) exp(-J(J+1)/theta): J = sqrt(theta/2) - 1/2 = 2.15 for theta = 14.
    expect(rotorEnvelope(9, 14).indexOf(1)).toBe(2)
  })
})

describe('envelopeStrokes', () => {
  it('places lines by energy and lets one that is not positive hang at no length', () => {
    const line = (label: string, termEnergy: number, intensity: number) => ({ label, termEnergy, intensity, model: null })
    expect(envelopeStrokes([line('a', 0, 10), line('b', 50, -3), line('c', 100, 5)]).map(stroke => [stroke.x, stroke.measured])).toEqual([[0, 1], [0.5, 0], [1, 0.5]])
  })
})

describe('temperatureScale', () => {
  it('holds every value with its uncertainty', () => {
    const scale = temperatureScale([row({ temperature: 180, uNoise: 5 }), row({ temperature: 200, uNoise: 1 }), row({ temperature: null })])!
    for (const value of [175, 201]) expect(placeOn(scale, value)).toSatisfy((place: number) => place > 0 && place < 1)
  })
  it('is absent when there is nothing to place', () => expect(temperatureScale([row({ temperature: null })])).toBeNull())
})

describe('dayTicks', () => {
  it('stand at whole days inside the range and are never too many', () => {
    const from = Date.parse('2026-01-01T07:00:00Z')
    const ticks = dayTicks(from, from + 60 * 86_400_000)
    expect(ticks.length).toBeGreaterThan(2)
    expect(ticks.length).toBeLessThanOrEqual(9)
    expect(ticks.every(tick => tick % 86_400_000 === 0 && tick >= from)).toBe(true)
  })
})

describe('lineListRows', () => {
  const component = (name: string, gUpper: number, strengths: Record<string, number>) => ({ component: name, wavenumber: 6500, termUpper: 7000, termLower: 500, gUpper, gLower: 4, strengths })
  const band: LineListBand = { id: '3-1', title: 'OH(3-1)', caution: '', recommendedLines: ['P1(2)'], lines: [{ label: 'P1(2)', branch: 'P1', components: [component('e', 4, { x: 10, y: 1 }), component('f', 12, { x: 20 })] }] }
  it('weighs the components of a line by their upper degeneracy', () => {
    expect(lineListRows(band, ['x'])[0]).toMatchObject({ recommended: true, gUpper: 16, wavelengthNm: '1538.462', strengths: { x: '17.50' } })
  })
  it('shows no strength where a set lacks a component', () => expect(lineListRows(band, ['y'])[0]!.strengths.y).toBe('–'))
})
