import { expect, it } from 'vitest'
import { plainCopy, putAt, sameValue, valueAt } from '~/utils/objects/paths'

it('a value is found and put at the end of its way', () => {
  const tree = { settings: { profile: { fwhm: null as number | null }, masks: [[1, 2]] } }
  expect([valueAt(tree, 'settings.profile.fwhm'), valueAt(tree, 'settings.masks.0.1'), valueAt(tree, 'settings.nothing.fwhm')]).toEqual([null, 2, undefined])
  putAt(tree, 'settings.profile.fwhm', 0.2)
  putAt(tree, 'nowhere.at.all', 1)
  expect(tree).toEqual({ settings: { profile: { fwhm: 0.2 }, masks: [[1, 2]] } })
})

it('a copy shares nothing with what it was made from, and keeps a number that is none', () => {
  const values = { masks: [[1, Number.NaN]], profile: { fwhm: null } }
  const copy = plainCopy(values)
  copy.masks[0]![0] = 7
  expect([values.masks[0]![0], copy.masks[0]![1], sameValue(values.profile, copy.profile)]).toEqual([1, Number.NaN, true])
})
