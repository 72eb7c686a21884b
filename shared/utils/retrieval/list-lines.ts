import type { ModelLine } from '../../engine/types'
import type { LineList, LineListBand, LineListLine, LineListStrengthSet } from '../../types/line-list'

/** A line of a list with the band it belongs to and the name it goes by in this retrieval. */
export interface ChosenLine { band: LineListBand, line: LineListLine, label: string }

/** einsteinA of each component under a set; null when the set lacks one of them. */
export function strengthsOf(line: LineListLine, set: string): number[] | null {
  const found = line.components.map(component => component.strengths[set])
  return found.every(value => value !== undefined) ? found : null
}

/** A list line as the engine takes it. The set must have it. */
export function modelLine({ band, line, label }: ChosenLine, set: string): ModelLine {
  return {
    label,
    band: band.id,
    components: line.components.map(({ wavenumber, termUpper, termLower, gUpper, gLower, strengths }) => ({
      wavenumber, termUpper, termLower, gUpper, gLower, einsteinA: strengths[set] ?? Number.NaN,
    })),
  }
}

/** Finds a line of a band by label; "4-2 P1(2)" names the band as well. */
export function findLine(band: LineListBand, label: string): LineListLine | undefined {
  const plain = label.startsWith(`${band.id} `) ? label.slice(band.id.length + 1) : label
  return band.lines.find(line => line.label === plain)
}

/** The strength set to use: the one asked for, or the first of the list that has every chosen line. */
export function chooseStrengthSet(list: LineList, chosen: readonly ChosenLine[], asked: string | null): { set: string } | { message: string } {
  const names = list.strengthSets.map(set => set.name)
  const lacking = (set: string) => chosen.filter(({ line }) => strengthsOf(line, set) === null)
  const complete = names.filter(name => lacking(name).length === 0)
  if (asked === null) return complete.length > 0 ? { set: complete[0] } : { message: `No strength set of ${list.id} has all the chosen lines.` }
  if (!names.includes(asked)) return { message: `The line list ${list.id} has no strength set "${asked}"; it has ${names.join(', ')}.` }
  const missing = lacking(asked)
  if (missing.length === 0) return { set: asked }
  const others = complete.length > 0 ? `; complete for these lines: ${complete.join(', ')}` : ''
  return { message: `The strength set ${asked} lacks ${missing.map(({ label }) => label).join(', ')}${others}.` }
}

/** The list's other sets that have every chosen line, for the comparison beside the result. */
export function alternativeSets(list: LineList, chosen: readonly ChosenLine[], used: string): Pick<LineListStrengthSet, 'name' | 'comparisonOnly'>[] {
  return list.strengthSets
    .filter(({ name }) => name !== used && chosen.every(({ line }) => strengthsOf(line, name) !== null))
    .map(({ name, comparisonOnly }) => ({ name, ...(comparisonOnly ? { comparisonOnly } : {}) }))
}
