import type { LineComponent, Observable, ObservableReading } from '../../engine/types'
import type { TableLine } from '../../schemas/line-table'
import type { InputProblem } from './problem'

type Field = 'wavenumber' | 'termUpper' | 'termLower' | 'gUpper' | 'gLower' | 'A' | 'scatteredWavenumber' | 'spinWeight' | 'J' | 'branch'

const needs: Record<Observable, Field[]> = {
  'photon-emission': ['termUpper', 'gUpper', 'A'],
  'energy-emission': ['wavenumber', 'termUpper', 'gUpper', 'A'],
  'brightness-integral': ['wavenumber', 'termUpper', 'gUpper', 'A'],
  'absorption-area': ['wavenumber', 'termLower', 'gUpper', 'A'],
  'optical-depth-integral': ['wavenumber', 'termLower', 'gUpper', 'A'],
  'equivalent-width': ['wavenumber', 'termLower', 'gUpper', 'A'],
  'level-population': ['termUpper', 'gUpper'],
  'raman-scatter': ['scatteredWavenumber', 'spinWeight', 'J', 'branch'],
  'envelope-only': ['termUpper', 'gUpper'],
}

function neededFields({ observable, populationPer }: ObservableReading, line: TableLine): Field[] {
  if (observable === 'level-population' && populationPer === 'state') return ['termUpper']
  if (observable === 'raman-scatter') return [...needs[observable], line.branch === 'anti-stokes' ? 'termUpper' : 'termLower']
  return needs[observable]
}

/** One problem for each molecular number that the observable needs and the line lacks. A term may stand for its partner when the wavenumber is given. */
export function molecularProblems(line: TableLine, reading: ObservableReading, index: number): InputProblem[] {
  const given = { ...line, ...termsOf(line) }
  const fields = neededFields(reading, line)
  return fields.filter(field => given[field] === undefined).map(field => ({
    path: `lines.${index}.${field}`,
    message: `${line.label}: ${reading.observable} needs ${fields.join(', ')}; ${field} is missing. Give it with the line, or name a line list.`,
  }))
}

/** Upper and lower term, each filled from the other by the wavenumber where only one is given. */
function termsOf({ termUpper, termLower, wavenumber }: TableLine): { termUpper?: number, termLower?: number } {
  const upper = termUpper ?? (termLower !== undefined && wavenumber !== undefined ? termLower + wavenumber : undefined)
  const lower = termLower ?? (termUpper !== undefined && wavenumber !== undefined ? termUpper - wavenumber : undefined)
  return { ...(upper === undefined ? {} : { termUpper: upper }), ...(lower === undefined ? {} : { termLower: lower }) }
}

/** The engine's component of an in-line line. What the observable does not need is filled with neutral numbers. */
export function componentOf(line: TableLine): LineComponent {
  const { termUpper, termLower } = termsOf(line)
  const wavenumber = line.wavenumber ?? (termUpper !== undefined && termLower !== undefined && termUpper > termLower ? termUpper - termLower : 1)
  return {
    wavenumber,
    termUpper: termUpper ?? 0,
    termLower: termLower ?? 0,
    gUpper: line.gUpper ?? 1,
    gLower: line.gLower ?? 1,
    einsteinA: line.A ?? 1,
    ...(line.scatteredWavenumber !== undefined && line.spinWeight !== undefined && line.J !== undefined && line.branch !== undefined
      ? { raman: { scatteredWavenumber: line.scatteredWavenumber, spinWeight: line.spinWeight, J: line.J, branch: line.branch } }
      : {}),
  }
}
