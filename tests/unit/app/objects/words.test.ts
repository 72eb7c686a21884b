import { describe, expect, it } from 'vitest'
import { settingsSchema } from '#shared/schemas/settings'
import { flatSettings } from '#shared/utils/settings-changes'
import { datesWords, standing } from '~/utils/campaign-words'
import { aheadWords } from '~/utils/objects/ahead-words'
import { campaignFields, emptyCampaign } from '~/utils/objects/campaign-fields'
import { emptyInstrument, instrumentFields } from '~/utils/objects/instrument-fields'
import { altitudeWords, longitudeWords, placeWords } from '~/utils/objects/place-words'
import { recipeCopy, settingFields } from '~/utils/objects/recipe-fields'
import { missingBand, takenAddress } from '~/utils/objects/recipe-form-rules'
import { differenceRows, settingRows } from '~/utils/objects/recipe-rows'
import { emptyStation, stationFields } from '~/utils/objects/station-fields'

describe('fields in words', () => {
  it('are there for every field of every form', () => {
    expect(campaignFields.map(field => field.path).sort()).toEqual(Object.keys(emptyCampaign()).sort())
    expect(stationFields.map(field => field.path).sort()).toEqual(Object.keys(emptyStation()).sort())
    expect(instrumentFields.map(field => field.path).sort()).toEqual(Object.keys(emptyInstrument()).sort())
    expect(settingFields.map(field => field.path).sort()).toEqual(Object.keys(flatSettings(settingsSchema.parse({}))).sort())
  })

  it('say something for every value that a form begins with', () => {
    const said = (fields: typeof campaignFields, values: object) => fields.map(({ path, words }) => words((values as Record<string, unknown>)[path]))
    for (const text of [...said(campaignFields, emptyCampaign()), ...said(stationFields, emptyStation()), ...said(instrumentFields, emptyInstrument()), ...said(settingFields, flatSettings(settingsSchema.parse({})))]) {
      expect(text).toMatch(/^[^[{]+$/)
      expect(text).not.toMatch(/null|undefined|true|false/)
    }
  })

  it('keep a choice that has no words yet as it stands', () => {
    const axis = instrumentFields.find(field => field.path === 'axisUnit')!
    expect([axis.words('cm-1'), axis.words('furlong'), axis.words(null)]).toEqual(['wavenumber, cm⁻¹', 'furlong', 'not stated'])
  })
})

describe('a place in words', () => {
  it('has its hemispheres, and east beyond 180 degrees is west', () => {
    expect(placeWords({ latitude: 61.42, longitude: 9.87, altitude: 1130 })).toBe('61.420° N, 9.870° E, 1,130 m')
    expect(placeWords({ latitude: -31.2, longitude: 342.5, altitude: null })).toBe('31.200° S, 17.500° W')
    expect([longitudeWords(-70.3), longitudeWords(null), altitudeWords(-12)]).toEqual(['70.300° W', '–', '−12 m'])
  })
  it('is nothing while a number is still being typed', () => expect(placeWords({ latitude: Number.NaN, longitude: 1, altitude: null })).toBe(''))
})

describe('how far a clock is ahead', () => {
  it.each([[0, 'the same as UTC'], [2_368_800, '39 min 29 s ahead of UTC'], [-19_200_000, '5 h 20 min behind UTC'], [43_200_000, '12 h ahead of UTC']])('%s ms is %s', (ms, words) => expect(aheadWords(ms)).toBe(words))
})

describe('dates and standing of a campaign', () => {
  it.each([[null, null, ''], ['2026-01-01', null, 'from 2026-01-01'], [null, '2026-03-31', 'until 2026-03-31'], ['2026-01-01', '2026-03-31', '2026-01-01 to 2026-03-31'], ['2026-01-01', '2026-01-01', '2026-01-01']])('%s, %s: %s', (startsOn, endsOn, words) => expect(datesWords({ startsOn, endsOn })).toBe(words))
  it('tells a member from a visitor', () => expect([standing({ role: 'reader', member: true }), standing({ role: 'reader', member: false })]).toEqual(['you are reader', 'open to every account']))
})

describe('two recipes', () => {
  const recipe = (name: string, said: object) => ({ name, settings: settingsSchema.parse(said) })
  it('are told by what differs and by nothing else', () => {
    expect(differenceRows(recipe('A', { bands: ['3-1'], seed: 2 }), recipe('B', { bands: ['4-2'], seed: 2, profile: { fwhm: 0.2 } }))).toEqual([
      { path: 'name', label: 'Name', left: 'A', right: 'B' },
      { path: 'bands', label: 'Bands', left: '3-1', right: '4-2' },
      { path: 'profile.fwhm', label: 'Line width', left: 'fitted', right: '0.2 nm' },
    ])
    expect(differenceRows(recipe('A', {}), recipe('A', {}))).toEqual([])
  })
  it('do not tell of a background where none matters', () => {
    expect(settingRows(settingsSchema.parse({})).map(row => row.name)).not.toContain('background')
    expect(settingRows(settingsSchema.parse({ observable: 'brightness-integral' }))).toContainEqual({ name: 'background', value: '2.725 K' })
  })
  it('of which one is a copy differ in name and address, within the limits', () => {
    const copy = recipeCopy(recipe('x'.repeat(120), {}))
    expect([copy.name.length, copy.name.endsWith(' (copy)'), copy.slug]).toEqual([120, true, 'x'.repeat(60)])
  })
})

describe('the form of a recipe', () => {
  const form = (lineList: string | null, bands: string[]) => ({ slug: 'oh', name: 'OH', settings: settingsSchema.parse({ lineList, bands }) })
  it('wants a band of the list that is chosen', () => {
    expect([missingBand(form('oh-meinel', [])).length, missingBand(form('oh-meinel', ['3-1'])).length, missingBand(form(null, [])).length]).toEqual([1, 0, 0])
  })
  it('does not become the next version of another recipe by mistake', () => {
    expect(takenAddress(form(null, []), [{ slug: 'oh' }])[0]?.path).toBe('slug')
    expect(takenAddress(form(null, []), [{ slug: 'oh-2' }])).toEqual([])
  })
})
