import type { LogbookView } from '#shared/schemas/logbook'
import { wordsOf } from '~/utils/logbook/deeds'
import { campaignFields } from '~/utils/objects/campaign-fields'
import type { FieldWords } from '~/utils/objects/field-words'
import { instrumentFields } from '~/utils/objects/instrument-fields'
import { sameValue } from '~/utils/objects/paths'
import { recipeFields, settingFields } from '~/utils/objects/recipe-fields'
import { spectrumFields } from '~/utils/objects/spectrum-fields'
import { stationFields } from '~/utils/objects/station-fields'

export interface ChangeWords { label: string, from: string, to: string }
type Detail = Record<string, unknown>

const fieldsOf: Record<string, FieldWords[]> = {
  campaign: campaignFields, station: stationFields, instrument: instrumentFields, recipe: recipeFields, spectrum: spectrumFields, retrieval: settingFields,
}

const isRecord = (value: unknown): value is Detail => typeof value === 'object' && value !== null && !Array.isArray(value)
const isChange = (value: unknown): value is { from: unknown, to: unknown } => isRecord(value) && 'from' in value && 'to' in value

/** A value of which no field is known: as it stands, or "nothing". */
const plain = (value: unknown): string => value === null || value === undefined || value === '' ? 'nothing' : typeof value === 'string' ? value : JSON.stringify(value)

function changeWords(kind: string, path: string, { from, to }: { from: unknown, to: unknown }): ChangeWords {
  const field = fieldsOf[kind]?.find(known => known.path === path)
  const words = field?.words ?? plain
  return { label: field?.label ?? wordsOf(path), from: words(from), to: words(to) }
}

/** Both whole rows stand in the entry: the fields that differ. */
const rowChanges = (kind: string, from: Detail, to: Detail): ChangeWords[] =>
  Object.keys({ ...from, ...to }).filter(path => !sameValue(from[path], to[path])).map(path => changeWords(kind, path, { from: from[path], to: to[path] }))

/** What an entry says was changed, field by field, from what to what. */
export function changesIn({ object, detail }: Pick<LogbookView, 'object' | 'detail'>): ChangeWords[] {
  if (isRecord(detail.from) && isRecord(detail.to)) return rowChanges(object.kind, detail.from, detail.to)
  return Object.entries(detail).flatMap(([path, value]) => isChange(value) ? [changeWords(object.kind, path, value)] : [])
}

/** What an entry says besides: a note, a verdict, a recipe. */
const remarkWords: Record<string, string> = { note: '', reason: '', verdict: '', recipe: 'recipe ', role: 'as ' }
const verdicts: Record<string, string> = { accept: 'accepted', return: 'returned' }

export const remarksIn = (detail: Detail): string[] => Object.entries(remarkWords).flatMap(([key, before]) => {
  const value = detail[key]
  return typeof value === 'string' && value ? [`${before}${verdicts[value] ?? value}`] : []
})
