import { expect, it } from 'vitest'
import { settingsSchema } from '#shared/schemas/settings'
import { recipeProblems } from '#shared/utils/recipe-problems'

const settings = (said: object) => settingsSchema.parse(said)

it('a range that ends before it begins is refused at its place', () => {
  const problems = recipeProblems(settings({ masks: [[1500, 1501], [1510, 1510], [1520, 1500]] }), null)
  expect(problems.map(problem => problem.path)).toEqual(['settings.masks.1', 'settings.masks.2'])
  expect(problems[1]!.message).toBe('The range from 1520 to 1500 nm does not end after it begins.')
})

it('nothing is said of bands and lines while the list is not there yet', () => {
  const unknown = settings({ lineList: 'oh-meinel', bands: ['77-1'] })
  expect(recipeProblems(unknown, undefined)).toEqual([])
  expect(recipeProblems(unknown, null).map(problem => problem.path)).toEqual(['settings.lineList'])
})
