import type { ModelLine } from '../types'
import { componentWavelength, lineExtent } from './shares'

/** Two lines closer than this part of a FWHM share one area or are left to the blend check. */
const closeness = 0.5

/** Smallest distance between components of two lines, nm. */
export function lineDistance(a: ModelLine, b: ModelLine): number {
  let least = Infinity
  for (const one of a.components) for (const other of b.components) least = Math.min(least, Math.abs(componentWavelength(one) - componentWavelength(other)))
  return least
}

/** One area for both. Lines of two bands make a band of their own: no scale of either speaks for them. */
/** Two lines that share one area. */
export const merged = (a: ModelLine, b: ModelLine): ModelLine => ({
  label: `${a.label} + ${b.label}`,
  band: a.band === b.band ? a.band : `${a.band} + ${b.band}`,
  components: [...a.components, ...b.components],
  ...(a.band === b.band && !a.mixesBands ? {} : { mixesBands: true }),
})

/**
 * Chooses the lines whose areas are measured: every used line by itself, and the others around them. Of the others, one that stands within half a
 * FWHM of a used line is left out (its area could not be told from the used one; the blend check weighs it), and those closer than that to
 * each other share one area. Sorted by wavelength.
 */
export function groupLines(used: readonly ModelLine[], others: readonly ModelLine[], fwhm: number): ModelLine[] {
  const near = closeness * fwhm
  const clear = others.filter(other => used.every(line => lineDistance(line, other) > near))
  const sorted = [...clear].sort((a, b) => lineExtent(a)[0] - lineExtent(b)[0])
  const groups: ModelLine[] = []
  for (const line of sorted) {
    const i = groups.findIndex(group => lineDistance(group, line) <= near)
    if (i === -1) groups.push(line)
    else groups[i] = merged(groups[i], line)
  }
  return [...used, ...groups].sort((a, b) => lineExtent(a)[0] - lineExtent(b)[0])
}
