import { expect, it } from 'vitest'
import { settingsSchema } from '#shared/schemas/settings'
import { flatSettings, settingsChanges } from '#shared/utils/settings-changes'

const settings = settingsSchema.parse({})

it('settings that are the same have no changes', () => {
  expect(settingsChanges(settings, settingsSchema.parse({}))).toEqual({})
})

it('each setting that differs is named with both values, the width of the profile by itself', () => {
  const other = settingsSchema.parse({ profile: { fwhm: 0.2 }, temperatureRange: [10, 400], bands: ['3-1'] })
  expect(settingsChanges(settings, other)).toEqual({
    'bands': { from: [], to: ['3-1'] },
    'temperatureRange': { from: [2, 20000], to: [10, 400] },
    'profile.fwhm': { from: null, to: 0.2 },
  })
})

it('no setting is forgotten when they are laid flat', () => {
  expect(Object.keys(flatSettings(settings)).length).toBe(Object.keys(settingsSchema.shape).length + 1)
})
