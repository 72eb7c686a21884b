import { C2 } from '../../engine/constants'
import type { LineList, LineListBand, LineListLine } from '../../types/line-list'
import type { ChosenLine } from './list-lines'
import { strengthsOf } from './list-lines'

/**
 * What decides whether a line beside the chosen ones gets an area of its own: expected photons at a warm rotational temperature, with
 * the vibrational levels at 9000 K (Rousselot et al. 2000). Rough on purpose; an area that is not needed costs little.
 */
const warm = 400
const vibrational = 9000
/** Part of the weakest chosen line from which a line is measured beside it. */
const significant = 0.01

/** Lowest upper term of a band, cm^-1: its vibrational energy. */
function upperOrigin(band: LineListBand): number {
  return band.lines.reduce((low, line) => line.components.reduce((least, component) => Math.min(least, component.termUpper), low), Infinity)
}

function strengthFor(list: LineList, line: LineListLine, set: string): number[] | null {
  const names = [set, ...list.strengthSets.filter(({ absolute }) => absolute).map(({ name }) => name), ...list.strengthSets.map(({ name }) => name)]
  for (const name of names) {
    const found = strengthsOf(line, name)
    if (found) return found
  }
  return null
}

function expected(list: LineList, line: LineListLine, origin: number, set: string): number {
  const strengths = strengthFor(list, line, set)
  if (!strengths) return 0
  return line.components.reduce((sum, { gUpper, termUpper }, c) => {
    const boltzmann = Math.exp(-C2 * ((termUpper - origin) / warm + origin / vibrational))
    return sum + strengths[c] * gUpper * boltzmann
  }, 0)
}

/** Lines of the whole list between two wavelengths (vacuum nm) that may be seen beside the chosen ones, and the fainter rest. */
export function linesBeside(list: LineList, chosen: readonly ChosenLine[], [from, to]: [number, number], set: string): { nuisance: ChosenLine[], faint: ChosenLine[] } {
  const origins = new Map(list.bands.map(band => [band, upperOrigin(band)]))
  const brightness = ({ band, line }: ChosenLine) => expected(list, line, origins.get(band) ?? 0, set)
  const weakest = Math.min(...chosen.map(brightness))
  const taken = new Set(chosen.map(({ line }) => line))
  const single = new Set(chosen.map(({ band }) => band)).size === 1
  const near = list.bands.flatMap(band => band.lines
    .filter(line => !taken.has(line) && line.components.some(({ wavenumber }) => 1e7 / wavenumber >= from && 1e7 / wavenumber <= to))
    .map(line => ({ band, line, label: single && band === chosen[0].band ? line.label : `${band.id} ${line.label}` })))
  const bright = (line: ChosenLine) => brightness(line) >= significant * weakest
  return { nuisance: near.filter(bright), faint: near.filter(line => !bright(line) && brightness(line) > 0) }
}
