import type { RecipeForm, RecipeView } from '#shared/schemas/recipe'
import { settingsSchema } from '#shared/schemas/settings'
import { slugOf } from '#shared/utils/slug'
import { choice, list, quantity, text, type FieldWords } from '~/utils/objects/field-words'
import { methodWords, noiseWords, observableWords } from '~/utils/setting-words'

type Range = [number, number]
const rangeWords = ([from, to]: Range, unit: string) => `${from} to ${to} ${unit}`

/** Every setting of a recipe, by its path in a flat record of settings. */
export const settingFields: FieldWords[] = [
  choice('observable', 'Observable', observableWords),
  text('lineList', 'Line list', 'none: molecular data come with the lines'),
  list('bands', 'Bands', 'the only band of the list'),
  list('lines', 'Lines', 'the recommended ones of the list'),
  text('strengthSet', 'Strength set', 'the recommended set that is complete for the lines'),
  choice('method', 'Method', methodWords),
  choice('noise', 'Noise of the data', noiseWords),
  text('profile.shape', 'Line profile'),
  quantity('profile.fwhm', 'Line width', 'nm', 'fitted'),
  choice('shift', 'Shift of the axis', { free: 'fitted, one for all lines', fixed: 'none' }),
  quantity('continuumOrder', 'Order of the continuum', ''),
  { path: 'masks', label: 'Ranges left out', words: value => (value as Range[]).map(range => rangeWords(range, 'nm')).join(', ') || 'none' },
  { path: 'temperatureRange', label: 'Temperatures searched', words: value => rangeWords(value as Range, 'K') },
  quantity('Tbg', 'Background', 'K'),
  choice('bandScales', 'Scale of the bands', { own: 'own for each band', common: 'common to all' }),
  choice('populationPer', 'Population of', { level: 'the level, N', state: 'one state, N / g' }),
  choice('widthIn', 'Width is in', { wavelength: 'wavelength', wavenumber: 'wavenumber', velocity: 'velocity' }),
  choice('signalIn', 'Signal counts', { photons: 'photons', energy: 'energy' }),
  text('robust', 'Robust weights', 'none'),
  quantity('seed', 'Seed', ''),
]

export const recipeFields: FieldWords[] = [
  text('name', 'Name'),
  text('slug', 'Address'),
  quantity('version', 'Version', ''),
  ...settingFields.map(field => ({ ...field, path: `settings.${field.path}` })),
]

export const emptyRecipe = (): RecipeForm => ({ slug: '', name: '', settings: settingsSchema.parse({}) })

export const recipeForm = ({ slug, name, settings }: RecipeView): RecipeForm => ({ slug, name, settings })

/** A recipe to begin another one from. */
export function recipeCopy({ name, settings }: Pick<RecipeView, 'name' | 'settings'>): RecipeForm {
  const copied = `${name.slice(0, 113)} (copy)`
  return { slug: slugOf(copied) || 'recipe', name: copied, settings }
}
