import type { TableLine } from '../../schemas/line-table'

export type LineField = keyof TableLine

/** Headings by field, in small letters without spaces, underscores and units. */
const headings: Record<LineField, string[]> = {
  label: ['label', 'line', 'transition', 'name'],
  band: ['band'],
  intensity: ['intensity', 'i', 'flux', 'area', 'value', 'signal', 'population', 'n'],
  sigma: ['sigma', 'σ', 'error', 'err', 'uncertainty', 'unc', 'sigmaintensity', 'intensityerror', 'intensitysigma', 'fluxerr', 'fluxerror'],
  wavenumber: ['wavenumber', 'nu'],
  termUpper: ['termupper', 'eupper', 'eup', 'eu'],
  termLower: ['termlower', 'elower', 'elow', 'el'],
  gUpper: ['gupper', 'gup', 'gu'],
  gLower: ['glower', 'glow', 'gl'],
  A: ['a', 'einsteina', 'aul'],
  scatteredWavenumber: ['scatteredwavenumber'],
  spinWeight: ['spinweight'],
  J: ['j'],
  branch: ['branch'],
}
const fieldByHeading = new Map(Object.entries(headings).flatMap(([field, words]) => words.map(word => [word, field as LineField])))
const perCentimetre: LineField[] = ['wavenumber', 'termUpper', 'termLower', 'scatteredWavenumber']
export const textFields: LineField[] = ['label', 'band', 'branch']

export type HeadingReading = { field: LineField } | { problem: string }

export function fieldOf(heading: string): HeadingReading {
  const [, name = '', unit] = /^(.*?)\s*(?:[([]\s*(.*?)\s*[)\]])?$/.exec(heading.trim()) ?? []
  const field = fieldByHeading.get(name.toLowerCase().replace(/[\s_]/g, ''))
  if (!field) return { problem: `"${heading}" is not a column of a line table. Known columns: ${Object.keys(headings).join(', ')}.` }
  if (unit && perCentimetre.includes(field) && !/^(cm-1|cm\^-1|1\/cm|cm⁻¹|cm\*\*-1)$/i.test(unit)) return { problem: `"${heading}": ${field} is given in cm-1. Convert the column.` }
  return { field }
}
