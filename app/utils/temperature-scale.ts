export interface TemperatureScale { low: number, high: number }
interface Valued { temperature: number | null, uNoise: number | null }

/** The range of a page of results with their uncertainties, a little widened; null when there is nothing to place. */
export function temperatureScale(rows: Valued[]): TemperatureScale | null {
  const placed = rows.filter((row): row is Valued & { temperature: number } => row.temperature != null)
  if (!placed.length) return null
  const low = Math.min(...placed.map(row => row.temperature - (row.uNoise ?? 0)))
  const high = Math.max(...placed.map(row => row.temperature + (row.uNoise ?? 0)))
  const margin = (high - low || Math.abs(high) || 1) * 0.04
  return { low: low - margin, high: high + margin }
}

/** Where a value stands on the scale, 0..1. */
export const placeOn = (scale: TemperatureScale, value: number): number =>
  Math.min(1, Math.max(0, (value - scale.low) / (scale.high - scale.low)))
