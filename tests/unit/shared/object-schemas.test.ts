import { describe, expect, it } from 'vitest'
import { campaignCreateSchema, campaignPatchSchema } from '#shared/schemas/campaign'
import { slugSchema } from '#shared/schemas/fields'
import { instrumentFormSchema, instrumentPatchSchema } from '#shared/schemas/instrument'
import { recipePatchSchema } from '#shared/schemas/recipe'
import { stationCreateSchema, stationPatchSchema } from '#shared/schemas/station'

const messages = (answer: { success: boolean, error?: { issues: { path: PropertyKey[], message: string }[] } }) => answer.error?.issues.map(issue => `${issue.path.join('.')}: ${issue.message}`) ?? []

describe('a change of a thing that a campaign owns', () => {
  it('says only what is said: no default is filled in for what is left out', () => {
    expect(campaignPatchSchema.parse({ version: 1, title: 'Ridge' })).toEqual({ version: 1, title: 'Ridge' })
    expect(stationPatchSchema.parse({ version: 1 })).toEqual({ version: 1 })
    expect(instrumentPatchSchema.parse({ version: 3, notes: '' })).toEqual({ version: 3, notes: '' })
    expect(recipePatchSchema.parse({ version: 2, name: 'x' })).toEqual({ version: 2, name: 'x' })
  })

  it('needs the version that was read', () => {
    for (const schema of [campaignPatchSchema, stationPatchSchema, instrumentPatchSchema, recipePatchSchema]) expect(schema.safeParse({}).success).toBe(false)
  })

  it.each([['station', stationPatchSchema], ['instrument', instrumentPatchSchema], ['recipe', recipePatchSchema]])('does not take another address for a %s, and says why', (_, schema) => {
    expect(messages(schema.safeParse({ version: 1, slug: 'other' }))[0]).toMatch(/^slug: The address of an? \w+ stays as it is, because files, scripts and results name it\./)
  })
})

describe('names', () => {
  const name = (text: string) => stationCreateSchema.safeParse({ name: text })
  it.each(['Ærø', '氷の夜', '\u200Fלילה\u200E', '🔭🌌', '"Ridge" & <co>', 'x'.repeat(120)])('may be %s', text => expect(name(text).success).toBe(true))
  it.each(['', '   ', 'x'.repeat(121), 'two\nlines', 'nul\u0000'])('may not be %j', text => expect(messages(name(text))[0]).toMatch(/^name: The name/))
})

describe('numbers', () => {
  const instrument = { slug: 'eye', name: 'Eye', station: null, axisUnit: null, medium: null, valueKind: null, defaultObservable: null, notes: '' }
  it('that are none are asked for in words', () => {
    expect(messages(stationCreateSchema.safeParse({ name: 'A', latitude: Number.NaN, longitude: 1 }))).toContain('latitude: Enter a number, with a point for decimals.')
    expect(messages(stationCreateSchema.safeParse({ name: 'A', latitude: 91, longitude: 1 }))).toEqual(['latitude: A latitude is between -90 and 90 degrees; south is negative.'])
  })
  it('of a line width and a resolving power are not both stated', () => {
    expect(messages(instrumentFormSchema.safeParse({ ...instrument, fwhm: 1, resolvingPower: 100 }))).toEqual(['resolvingPower: State the line width or the resolving power, not both.'])
    expect(instrumentFormSchema.safeParse({ ...instrument, fwhm: null, resolvingPower: 100 }).success).toBe(true)
  })
})

describe('dates of a campaign', () => {
  it('may be open at either end, and may not run backwards', () => {
    expect(campaignCreateSchema.safeParse({ title: 'A', startsOn: '2026-01-14' }).success).toBe(true)
    expect(campaignCreateSchema.safeParse({ title: 'A', startsOn: '2026-01-14', endsOn: '2026-01-14' }).success).toBe(true)
    expect(messages(campaignCreateSchema.safeParse({ title: 'A', startsOn: '2026-01-14', endsOn: '2026-01-13' }))).toEqual(['endsOn: The last day is before the first one.'])
    expect(campaignCreateSchema.safeParse({ title: 'A', startsOn: '2026-02-30' }).success).toBe(false)
  })
})

it('the words that pages use are no addresses', () => {
  expect(['new', 'compare', 'newer', 'a-new-one'].map(slug => slugSchema.safeParse(slug).success)).toEqual([false, false, true, true])
})
