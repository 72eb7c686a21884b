import type { PlotLine, RetrievalResult, ResultLine } from '#shared/engine/types'

/** One mark of the Boltzmann plot. `low` null: the error bar reaches the edge, where the logarithm ends. */
export interface BoltzmannPoint {
  label: string
  band: string
  x: number
  y: number
  low: number
  high: number
  /** I <= 3 sigma: the logarithm leans, so the mark is hollow. */
  hollow: boolean
  /** I <= 0: no logarithm; the mark sits on the edge. */
  atEdge: boolean
  used: boolean
}

export interface BoltzmannSeries {
  bands: { band: string, points: BoltzmannPoint[], fit: { x: number, y: number }[] }[]
  /** Ordinate of the marked edge; null when no mark needs it. */
  edge: number | null
  energyTitle: string
}

const signalToNoise = (line: ResultLine) => (line.sigma ? line.intensity / line.sigma : Infinity)

/** Energies far above their own spread are read from the lowest line; several bands each from their own. */
function energyOrigins(lines: ResultLine[]): { origins: Map<string, number>, title: string } {
  const byBand = new Map<string, number[]>()
  for (const line of lines) byBand.set(line.band, [...byBand.get(line.band) ?? [], line.termEnergy])
  const energies = lines.map(line => line.termEnergy)
  const low = Math.min(...energies)
  const far = low > 2 * (Math.max(...energies) - low)
  if (byBand.size > 1) {
    return { origins: new Map([...byBand].map(([band, all]) => [band, Math.min(...all)])), title: 'energy above the lowest line of its band / cm⁻¹' }
  }
  const origin = far ? low : 0
  const title = far ? `energy above ${low.toFixed(2)} cm⁻¹ / cm⁻¹` : 'level energy / cm⁻¹'
  return { origins: new Map([...byBand.keys()].map(band => [band, origin])), title }
}

/** Below every mark and its error bar, by a tenth of the height of the picture. */
function edgeOf(lines: ResultLine[]): number {
  const lows: number[] = []
  const highs: number[] = []
  for (const { intensity, sigma, strength } of lines) {
    if (intensity <= 0) continue
    const reach = sigma !== null && sigma < intensity ? intensity - sigma : intensity
    lows.push(Math.log(reach / strength))
    highs.push(Math.log((intensity + (sigma ?? 0)) / strength))
  }
  if (!lows.length) return 0
  const low = Math.min(...lows)
  return low - Math.max(0.1 * (Math.max(...highs) - low), 0.2)
}

function pointOf(line: ResultLine, origin: number, edge: number): BoltzmannPoint {
  const { intensity, sigma, strength } = line
  const ordinate = (value: number) => (value > 0 ? Math.log(value / strength) : edge)
  return {
    label: line.label,
    band: line.band,
    x: line.termEnergy - origin,
    y: ordinate(intensity),
    low: ordinate(intensity - (sigma ?? 0)),
    high: ordinate(intensity + (sigma ?? 0)),
    hollow: signalToNoise(line) <= 3,
    atEdge: intensity <= 0,
    used: line.used,
  }
}

function fitOf(plotLine: PlotLine | undefined, origin: number) {
  if (!plotLine) return []
  const { intercept, slope, energyRange: [low, high] } = plotLine
  const pad = Math.max(0.03 * (high - low), 0)
  return [low - pad, high + pad].map(energy => ({ x: energy - origin, y: intercept + slope * energy }))
}

/** ln(I/w) on level energy, band by band, with the fitted lines; data that have no logarithm stay in sight. */
export function boltzmannSeries(result: Pick<RetrievalResult, 'lines' | 'plotLines'>): BoltzmannSeries {
  const { origins, title } = energyOrigins(result.lines)
  const edge = edgeOf(result.lines)
  const bands = [...origins].map(([band, origin]) => ({
    band,
    points: result.lines.filter(line => line.band === band).map(line => pointOf(line, origin, edge)),
    fit: fitOf(result.plotLines.find(line => line.band === band), origin),
  }))
  const needed = bands.some(({ points }) => points.some(point => point.atEdge || point.low === edge))
  return { bands, edge: needed ? edge : null, energyTitle: title }
}
