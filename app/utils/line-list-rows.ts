import type { LineListBand, LineListLine } from '#shared/types/line-list'

export interface LineListRow {
  label: string
  recommended: boolean
  components: number
  /** Mean over the components, vacuum. */
  wavenumber: string
  wavelengthNm: string
  termUpper: string
  gUpper: number
  /** Sum over the upper states, A weighted by gUpper, by strength set. */
  strengths: Record<string, string>
}

const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length

/** One A for a line of several components: sum of g A over the sum of g, as the upper level emits it. */
function meanStrength(line: LineListLine, set: string): string {
  const weights = line.components.map(component => ({ g: component.gUpper, a: component.strengths[set] }))
  if (weights.some(({ a }) => a === undefined)) return '–'
  const total = weights.reduce((sum, { g }) => sum + g, 0)
  return (weights.reduce((sum, { g, a }) => sum + g * a!, 0) / total).toPrecision(4)
}

/** The lines of a band as a table shows them, by rising energy of the upper level. */
export function lineListRows(band: LineListBand, sets: string[]): LineListRow[] {
  return band.lines.map((line) => {
    const wavenumber = mean(line.components.map(component => component.wavenumber))
    return {
      label: line.label,
      recommended: band.recommendedLines.includes(line.label),
      components: line.components.length,
      wavenumber: wavenumber.toFixed(3),
      wavelengthNm: (1e7 / wavenumber).toFixed(3),
      termUpper: mean(line.components.map(component => component.termUpper)).toFixed(3),
      gUpper: line.components.reduce((sum, component) => sum + component.gUpper, 0),
      strengths: Object.fromEntries(sets.map(set => [set, meanStrength(line, set)])),
    }
  })
}
