import { describe, expect, it } from 'vitest'
import { loadLineList } from '#shared/line-lists/index'
import { recipeAddressSchema, parseRecipeAddress } from '#shared/schemas/recipe'
import { settingsSchema, type RetrievalSettingsInput } from '#shared/schemas/settings'
import { checkSettings } from '#shared/utils/check-settings'

async function problems(input: RetrievalSettingsInput): Promise<string[]> {
  const settings = settingsSchema.parse(input)
  const list = settings.lineList === null ? null : await loadLineList(settings.lineList)
  return checkSettings(settings, list).map(problem => problem.path)
}

describe('a recipe and its line list', () => {
  it('takes a recipe without a list, and one that names what the list has', async () => {
    expect(await problems({})).toEqual([])
    expect(await problems({ lineList: 'oh-meinel', bands: ['3-1', '4-2'], lines: ['P1(2)', 'P1(5)'], strengthSet: 'brooke2016' })).toEqual([])
    expect(await problems({ lineList: 'co-rotation', lines: ['1-0', '6-5'], strengthSet: 'cdms' })).toEqual([])
  })

  it('refuses a list that is not there', async () => {
    expect(await problems({ lineList: 'ammonia' })).toEqual(['settings.lineList'])
  })

  it('refuses bands, lines or a strength set of no list', async () => {
    expect(await problems({ bands: ['3-1'] })).toEqual(['settings.lineList'])
    expect(await problems({ strengthSet: 'brooke2016' })).toEqual(['settings.lineList'])
  })

  it('says which band and which line is unknown', async () => {
    expect(await problems({ lineList: 'oh-meinel', bands: ['3-1', '12-1'] })).toEqual(['settings.bands.1'])
    expect(await problems({ lineList: 'oh-meinel', bands: ['3-1'], lines: ['P1(2)', 'Z9(9)'] })).toEqual(['settings.lines.1'])
  })

  it('refuses a strength set that the list lacks, or that lacks a chosen line', async () => {
    expect(await problems({ lineList: 'oh-meinel', bands: ['3-1'], strengthSet: 'cdms' })).toEqual(['settings.strengthSet'])
    // tests/truth/airglow/oh-meinel: the HITRAN records at hand hold P1(2)-P1(5) of 3-1, and of 4-2 not P1(2).
    expect(await problems({ lineList: 'oh-meinel', bands: ['3-1'], strengthSet: 'hitran' })).toEqual([])
    expect(await problems({ lineList: 'oh-meinel', bands: ['4-2'], strengthSet: 'hitran' })).toEqual(['settings.strengthSet'])
  })
})

describe('the address of a recipe', () => {
  it('is a slug, with or without a version', () => {
    expect(parseRecipeAddress('oh-4-2@3')).toEqual({ slug: 'oh-4-2', version: 3 })
    expect(parseRecipeAddress('oh-4-2')).toEqual({ slug: 'oh-4-2', version: null })
  })

  it.each(['oh@0', 'oh@', '@1', 'OH@1', 'oh@1@2', 'oh@1.5'])('%s is none', (text) => {
    expect(recipeAddressSchema.safeParse(text).success).toBe(false)
  })
})

describe('the method of a recipe', () => {
  it.each(['spectrum', 'two-temperature', 'optical-depth'] as const)('%s is refused, with a list and without', async (method) => {
    expect(await problems({ method })).toEqual(['settings.method'])
    expect(await problems({ method, lineList: 'oh-meinel', bands: ['3-1'] })).toEqual(['settings.method'])
  })
})
