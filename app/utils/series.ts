import type { RetrievalRow } from '#shared/types/retrieval'

export interface SeriesPoint { x: number, y: number, yMin: number, yMax: number, id: string, name: string }
export interface StationSeries { station: string, points: SeriesPoint[] }

const pointOf = (row: RetrievalRow): SeriesPoint => {
  const value = row.temperature!
  const spread = row.uNoise ?? 0
  return { x: Date.parse(row.observedAt!), y: value, yMin: value - spread, yMax: value + spread, id: row.id, name: row.name }
}

/** Temperatures over time, one series for each station, in time order; rows without a time or a temperature cannot stand in it. */
export function stationSeries(rows: RetrievalRow[]): StationSeries[] {
  const byStation = new Map<string, SeriesPoint[]>()
  for (const row of rows) {
    if (row.temperature == null || !row.observedAt) continue
    const station = row.station ?? 'no station'
    byStation.set(station, [...(byStation.get(station) ?? []), pointOf(row)])
  }
  return [...byStation].sort(([a], [b]) => a.localeCompare(b)).map(([station, points]) => ({ station, points: points.sort((a, b) => a.x - b.x) }))
}

/** The series in one sentence for each station, for those who do not see the picture. */
export function seriesSummary(series: StationSeries[]): string {
  return series.map(({ station, points }) => {
    const values = points.map(point => point.y)
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length
    const day = (x: number) => new Date(x).toISOString().slice(0, 10)
    return `${station}: ${points.length} temperatures from ${day(points[0]!.x)} to ${day(points.at(-1)!.x)}, mean ${mean.toFixed(1)} K, lowest ${Math.min(...values).toFixed(1)} K, highest ${Math.max(...values).toFixed(1)} K.`
  }).join(' ')
}
