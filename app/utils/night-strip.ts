import type { StationView } from '#shared/schemas/station'
import type { Phase } from '#shared/types/phases'
import type { RetrievalRow } from '#shared/types/retrieval'
import { nightOf } from '#shared/utils/solar-time'
import { nightShares, type NightShares } from '~/utils/night-shares'

export interface NightCell extends NightShares { night: string }
export interface StationNights { station: string, nights: NightCell[] }

const dayMs = 86_400_000
const dayOf = (night: string) => Date.parse(`${night}T00:00:00Z`)

/** Every date from the first night to the last, at most `limit` of them, the newest kept. */
function calendar(nights: string[], limit: number): string[] {
  if (!nights.length) return []
  const sorted = [...nights].sort()
  const last = dayOf(sorted.at(-1)!)
  const first = Math.max(dayOf(sorted[0]!), last - (limit - 1) * dayMs)
  return Array.from({ length: Math.round((last - first) / dayMs) + 1 }, (_, i) => new Date(first + i * dayMs).toISOString().slice(0, 10))
}

/** What came in and what failed, night by night and station by station; nights with nothing stay in as gaps. */
export function nightStrip(rows: RetrievalRow[], stations: Pick<StationView, 'name' | 'longitude'>[], limit = 60): StationNights[] {
  // Rows name their station as people do.
  const longitudes = new Map(stations.map(station => [station.name, station.longitude]))
  const counts = new Map<string, Map<string, Partial<Record<Phase, number>>>>()
  const seen = new Set<string>()
  for (const row of rows) {
    if (!row.observedAt) continue
    const station = row.station ?? 'no station'
    const night = nightOf(row.observedAt, longitudes.get(station) ?? null)
    const nights = counts.get(station) ?? new Map()
    const phases = nights.get(night) ?? {}
    nights.set(night, { ...phases, [row.phase]: (phases[row.phase] ?? 0) + 1 })
    counts.set(station, nights)
    seen.add(night)
  }
  const dates = calendar([...seen], limit)
  return [...counts].sort(([a], [b]) => a.localeCompare(b))
    .map(([station, nights]) => ({ station, nights: dates.map(night => ({ night, ...nightShares(nights.get(night) ?? {}) })) }))
}
