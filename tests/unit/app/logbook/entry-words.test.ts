import { describe, expect, it } from 'vitest'
import type { LogbookView } from '#shared/schemas/logbook'
import { entryWords, inBursts } from '~/utils/logbook/entry-words'

const entry = (change: Partial<LogbookView>): LogbookView => ({
  id: '1', at: '2026-01-14T21:40:00.000Z', actor: 'Ada', action: 'change', detail: {}, object: { kind: 'station', id: 'S', name: 'Hollow Ridge', address: 'hollow-ridge' }, ...change,
})
const words = (change: Partial<LogbookView>) => entryWords(entry(change), 'winter')

describe('an entry of the logbook', () => {
  it('says who did what to which thing, with its page', () => {
    expect(words({ action: 'archive' })).toMatchObject({ when: '2026-01-14 21:40 UTC', who: 'Ada', deed: 'archived', noun: 'station', name: 'Hollow Ridge', to: '/campaigns/winter/stations/hollow-ridge' })
    expect(words({ actor: null, action: 'finish', object: { kind: 'retrieval', id: 'R', name: 'night 1', address: null } })).toMatchObject({ who: 'Trotline', deed: 'stored the result of', to: '/retrievals/R' })
    expect(words({ object: { kind: 'recipe', id: 'R', name: 'OH', address: 'oh@2' } }).to).toBe('/campaigns/winter/recipes/oh@2')
  })

  it('leads nowhere when the thing is gone or has no page', () => {
    expect(words({ object: { kind: 'station', id: 'S', name: null, address: null } })).toMatchObject({ name: null, to: null })
    expect(words({ object: { kind: 'spectrum', id: 'S', name: 'a.csv', address: null } }).to).toBeNull()
    expect(words({ action: 'delete', object: { kind: 'spectrum', id: 'S', name: null, address: null }, detail: { name: 'b.csv' } })).toMatchObject({ deed: 'deleted', name: 'b.csv' })
  })

  it('tells each field in words, from what to what', () => {
    expect(words({ detail: { latitude: { from: null, to: -31.2 }, name: { from: 'Ridge', to: 'Hollow Ridge' } } }).changes).toEqual([
      { label: 'Latitude', from: 'not stated', to: '−31.2 °' }, { label: 'Name', from: 'Ridge', to: 'Hollow Ridge' },
    ])
    const campaign = words({ object: { kind: 'campaign', id: 'C', name: 'Winter', address: 'winter' }, detail: { visibility: { from: 'members', to: 'service' }, selfReview: { from: false, to: true }, endsOn: { from: '2026-03-31', to: null } } })
    expect(campaign.changes.map(change => `${change.label}: ${change.from} > ${change.to}`)).toEqual(['Read by: its members only > every account of this service', 'Review of one’s own: not allowed > allowed', 'Last day: 2026-03-31 > open'])
    const recipe = words({ object: { kind: 'recipe', id: 'R', name: 'OH', address: 'oh@2' }, detail: { 'version': { from: 1, to: 2 }, 'settings.profile.fwhm': { from: null, to: 0.2 }, 'settings.masks': { from: [], to: [[1500, 1501]] } } })
    expect(recipe.changes.map(change => `${change.label}: ${change.from} > ${change.to}`)).toEqual(['Version: 1 > 2', 'Line width: fitted > 0.2 nm', 'Ranges left out: none > 1500 to 1501 nm'])
  })

  it('finds what differs where both whole rows were written down', () => {
    const about = { axisUnit: 'nm', medium: null, columns: { axis: 0, values: 1, sigma: null } }
    const amended = words({ action: 'amend', object: { kind: 'spectrum', id: 'S', name: 'a.csv', address: null }, detail: { from: about, to: { ...about, medium: 'air', columns: { axis: 0, values: 2, sigma: 3 } } } })
    expect(amended.changes).toEqual([{ label: 'Medium of the axis', from: 'not stated', to: 'air' }, { label: 'Columns', from: 'axis 1, values 2, no sigma', to: 'axis 1, values 3, sigma 4' }])
  })

  it('keeps its sense for deeds and fields that nobody has words for yet', () => {
    expect(words({ action: 'hand-over', object: { kind: 'response-curve', id: 'X', name: null, address: null }, detail: { validFrom: { from: null, to: '2026' } } })).toMatchObject({ deed: 'hand over', noun: 'response curve', changes: [{ label: 'valid from', from: 'nothing', to: '2026' }] })
  })

  it('tells deeds among people as a whole', () => {
    const among = (action: string, detail: Record<string, unknown>) => words({ action, detail, object: { kind: 'campaign', id: 'C', name: 'Winter', address: 'winter' } }).whole
    expect([among('invite', { email: 'bo@trotline.example', role: 'observer' }), among('join', { role: 'observer' }), among('change-role', { member: 'Bo', from: 'observer', to: 'analyst' }), among('remove-member', { member: 'Bo', role: 'analyst' }), among('invite', { role: 'reader' })]).toEqual([
      'invited bo@trotline.example as observer', 'joined as observer', 'changed the role of Bo from observer to analyst', 'removed Bo, who was analyst', 'invited somebody as reader',
    ])
    expect(among('archive', {})).toBeNull()
  })

  it('adds a note or a verdict', () => {
    expect(words({ action: 'review', detail: { verdict: 'return', note: 'Clouds.' } }).remarks).toEqual(['Clouds.', 'returned'])
  })
})

describe('a batch', () => {
  const submit = (id: string, change: Partial<LogbookView> = {}) => entryWords(entry({ id, action: 'submit', object: { kind: 'retrieval', id, name: id, address: null }, ...change }), 'winter')
  it('of many alike is told in one line, with its count', () => {
    expect(inBursts([submit('a'), submit('b'), submit('c')]).map(row => [row.id, row.count])).toEqual([['a', 3]])
  })
  it('is not mixed with what another person, another minute or another deed did', () => {
    const rows = inBursts([submit('a'), submit('b', { actor: 'Bo' }), submit('c', { actor: 'Bo', at: '2026-01-14T21:41:00.000Z' }), submit('d', { actor: 'Bo', at: '2026-01-14T21:41:00.000Z', action: 'abort' })])
    expect(rows.map(row => row.count)).toEqual([1, 1, 1, 1])
  })
  it('of stations is told one by one, for each has its name', () => {
    expect(inBursts([words({ action: 'create' }), words({ action: 'create' })]).length).toBe(2)
  })
})
