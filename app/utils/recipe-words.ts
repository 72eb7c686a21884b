import type { RetrievalSettings } from '#shared/schemas/settings'
import { observableWords } from '~/utils/setting-words'

/** A recipe in one line: what is measured, where, with which lines. */
export function recipeWords(settings: RetrievalSettings): string {
  const where = settings.lineList ? [settings.lineList, settings.bands.join(', ')].filter(Boolean).join(' ') : 'lines as given'
  const which = settings.lines.length ? settings.lines.join(', ') : settings.lineList ? 'recommended lines' : ''
  return [observableWords[settings.observable], where, which].filter(Boolean).join(' · ')
}
