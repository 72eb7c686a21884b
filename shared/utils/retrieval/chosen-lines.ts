import type { RetrievalSettings } from '../../schemas/settings'
import type { LineList, LineListBand } from '../../types/line-list'
import type { ChosenLine } from './list-lines'
import { findLine } from './list-lines'
import { nearLabels } from './near-labels'
import type { InputProblem } from './problem'

/** Lines of a single-band list need no band; every other list does. */
function chosenBands(list: LineList, bands: readonly string[]): LineListBand[] | InputProblem[] {
  const ids = list.bands.map(({ id }) => id)
  if (bands.length === 0 && list.bands.length === 1) return list.bands
  if (bands.length === 0) return [{ path: 'bands', message: `State the band: ${list.id} has ${ids.join(', ')}.` }]
  const unknown = bands.flatMap((id, i) => ids.includes(id) ? [] : [{ path: `bands.${i}`, message: `The line list ${list.id} has no band "${id}"; near: ${nearLabels(id, ids).join(', ')}.` }])
  return unknown.length > 0 ? unknown : list.bands.filter(({ id }) => bands.includes(id))
}

const areProblems = (found: LineListBand[] | InputProblem[]): found is InputProblem[] => found.length > 0 && 'path' in found[0]

/** The lines that the settings ask for, in every band that has them; labels repeated between bands get the band's name in front. */
export function chosenLines(list: LineList, { bands, lines }: Pick<RetrievalSettings, 'bands' | 'lines'>): ChosenLine[] | InputProblem[] {
  const found = chosenBands(list, bands)
  if (areProblems(found)) return found
  const named = (band: LineListBand, label: string) => found.length === 1 ? label : `${band.id} ${label}`
  const chosen = found.flatMap((band) => {
    const labels = lines.length > 0 ? lines : band.recommendedLines
    return [...new Set(labels.flatMap(label => findLine(band, label) ?? []))].map(line => ({ band, line, label: named(band, line.label) }))
  })
  const unknown = lines.flatMap((label, i) => found.some(band => findLine(band, label)) ? [] : [{
    path: `lines.${i}`,
    message: `No chosen band of ${list.id} has a line "${label}"; near: ${nearLabels(label, found.flatMap(band => band.lines.map(line => line.label))).join(', ')}.`,
  }])
  return unknown.length > 0 ? unknown : chosen
}

/** Did the choice fail? */
export function choiceFailed(found: ChosenLine[] | InputProblem[]): found is InputProblem[] {
  return found.length > 0 && 'path' in found[0]
}
