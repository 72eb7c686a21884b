import type { RecipeView } from '#shared/schemas/recipe'
import type { RetrievalSettings } from '#shared/schemas/settings'
import { flatSettings, settingsChanges } from '#shared/utils/settings-changes'
import { settingFields } from '~/utils/objects/recipe-fields'

export interface DifferenceRow { path: string, label: string, left: string, right: string }

const words = (path: string, value: unknown): string => settingFields.find(field => field.path === path)?.words(value) ?? String(value)
const labelOf = (path: string): string => settingFields.find(field => field.path === path)?.label ?? path

/** What differs between two recipes, and nothing else. */
export function differenceRows(left: Pick<RecipeView, 'name' | 'settings'>, right: Pick<RecipeView, 'name' | 'settings'>): DifferenceRow[] {
  const name = left.name === right.name ? [] : [{ path: 'name', label: 'Name', left: left.name, right: right.name }]
  const settings = Object.entries(settingsChanges(left.settings, right.settings))
    .map(([path, { from, to }]) => ({ path, label: labelOf(path), left: words(path, from), right: words(path, to) }))
  return [...name, ...settings]
}

/** Settings that say nothing for another observable are not shown with it. */
const onlyFor: Record<string, RetrievalSettings['observable']> = { Tbg: 'brightness-integral', populationPer: 'level-population', widthIn: 'equivalent-width', signalIn: 'raman-scatter' }

/** All settings of a recipe in words. */
export function settingRows(settings: RetrievalSettings): { name: string, value: string }[] {
  const flat = flatSettings(settings)
  return settingFields.filter(({ path }) => onlyFor[path] === undefined || onlyFor[path] === settings.observable)
    .map(({ path, label, words: say }) => ({ name: label.toLowerCase(), value: say(flat[path]) }))
}
