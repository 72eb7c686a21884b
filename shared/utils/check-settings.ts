import type { RetrievalSettings } from '../schemas/settings'
import type { FieldProblem } from '../types/error-codes'
import type { LineList, LineListBand } from '../types/line-list'
import { nearLabels } from './retrieval/near-labels'

/** Does the recipe name only what its line list has? The paths are those of the recipe's form. */
export function checkSettings(settings: RetrievalSettings, list: LineList | null): FieldProblem[] {
  if (settings.lineList === null) return [...unavailableMethod(settings), ...withoutList(settings)]
  if (list === null) return [{ path: 'settings.lineList', message: `There is no line list ${settings.lineList}.` }]
  const bands = settings.bands.length > 0 ? list.bands.filter(band => settings.bands.includes(band.id)) : list.bands
  return [...unavailableMethod(settings), ...unknownBands(settings, list), ...unknownLines(settings, bands), ...unknownStrengthSet(settings, list, bands)]
}

/** Only what the engine does is taken: another method must never be answered with this one's temperature. */
export const unavailableMethod = ({ method }: Pick<RetrievalSettings, 'method'>): FieldProblem[] => method === 'envelope'
  ? []
  : [{ path: 'settings.method', message: `The method ${method} is not available; use envelope, which takes one temperature from the line intensities.` }]

function withoutList({ bands, lines, strengthSet }: RetrievalSettings): FieldProblem[] {
  const message = 'Name the line list that this is taken from.'
  return bands.length + lines.length > 0 || strengthSet !== null ? [{ path: 'settings.lineList', message }] : []
}

const unknownBands = (settings: RetrievalSettings, list: LineList): FieldProblem[] =>
  settings.bands.flatMap((id, index) => list.bands.some(band => band.id === id)
    ? []
    : [{ path: `settings.bands.${index}`, message: `${list.title} has no band ${id}; near: ${nearLabels(id, list.bands.map(band => band.id)).join(', ')}.` }])

const unknownLines = (settings: RetrievalSettings, bands: LineListBand[]): FieldProblem[] =>
  settings.lines.flatMap((label, index) => bands.some(band => band.lines.some(line => line.label === label))
    ? []
    : [{ path: `settings.lines.${index}`, message: `None of the chosen bands has a line ${label}; near: ${nearLabels(label, bands.flatMap(band => band.lines.map(line => line.label))).join(', ')}.` }])

function unknownStrengthSet(settings: RetrievalSettings, list: LineList, bands: LineListBand[]): FieldProblem[] {
  const { strengthSet } = settings
  if (strengthSet === null) return []
  const path = 'settings.strengthSet'
  if (!list.strengthSets.some(set => set.name === strengthSet)) {
    const names = list.strengthSets.map(set => set.name).join(', ')
    return [{ path, message: `${list.title} has no strength set ${strengthSet}; it has ${names}.` }]
  }
  const lacking = bands.flatMap(band => chosenLines(settings, band)
    .filter(line => line.components.some(component => component.strengths[strengthSet] === undefined))
    .map(line => `${band.id} ${line.label}`))
  return settings.bands.length > 0 && lacking.length > 0
    ? [{ path, message: `${strengthSet} has no strength for ${lacking.slice(0, 5).join(', ')}${lacking.length > 5 ? ' and others' : ''}.` }]
    : []
}

function chosenLines(settings: RetrievalSettings, band: LineListBand) {
  const labels = settings.lines.length > 0 ? settings.lines : band.recommendedLines
  return band.lines.filter(line => labels.includes(line.label))
}
