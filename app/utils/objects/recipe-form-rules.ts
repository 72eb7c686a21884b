import type { RecipeForm, RecipeView } from '#shared/schemas/recipe'
import type { FieldProblem } from '#shared/types/error-codes'

/** Pages want bands to be named; a script may leave them out for a list of one band. */
export const missingBand = ({ settings }: RecipeForm): FieldProblem[] =>
  settings.lineList && settings.bands.length === 0 ? [{ path: 'settings.bands', message: 'Choose at least one band.' }] : []

/** Under an address that is there, a script makes the next version; on the page for a new recipe that would be a mistake. */
export const takenAddress = ({ slug }: RecipeForm, recipes: Pick<RecipeView, 'slug'>[]): FieldProblem[] =>
  recipes.some(recipe => recipe.slug === slug) ? [{ path: 'slug', message: 'There is a recipe at this address. Change that one, or choose another address.' }] : []
