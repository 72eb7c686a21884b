import type { RetrievalSettings } from '../schemas/settings'
import type { FieldProblem } from '../types/error-codes'
import type { LineList } from '../types/line-list'
import { checkSettings } from './check-settings'

/**
 * All that is wrong with a recipe beyond the kind of each value. Stored settings are never measured by it, so that a
 * recipe of former days can still be read. `list` undefined: not loaded yet, so nothing is said about it.
 */
export const recipeProblems = (settings: RetrievalSettings, list: LineList | null | undefined): FieldProblem[] =>
  [...backwardMasks(settings), ...(list === undefined ? [] : checkSettings(settings, list))]

const backwardMasks = ({ masks }: RetrievalSettings): FieldProblem[] => masks.flatMap(([from, to], index) =>
  from < to ? [] : [{ path: `settings.masks.${index}`, message: `The range from ${from} to ${to} nm does not end after it begins.` }])
