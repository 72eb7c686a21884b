import type { StationNight, StationNightsQuery } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'
import { nightBounds, solarOffsetMs } from '#shared/utils/solar-time'
import { database } from '../../database/client'
import { countNights, findNights } from '../../database/retrievals/nights'
import type { Actor } from '../accounts/actor'
import { stationFor, type StationAddress } from './one'

/** What came in at a station night by night, newest first; a night runs noon to noon in its solar time. */
export async function listNights(actor: Actor, address: StationAddress, { limit, cursor }: StationNightsQuery): Promise<Page<StationNight>> {
  const { id, longitude } = await stationFor(actor, address, 'see')
  const at = { stationId: id, solarOffsetMs: solarOffsetMs(longitude) }
  const [rows, total] = await Promise.all([findNights(database(), at, { before: cursor ?? null, limit: limit + 1 }), countNights(database(), at)])
  const shown = rows.slice(0, limit)
  return {
    items: shown.map(row => ({ ...row, ...nightBounds(row.night, longitude) })),
    nextCursor: rows.length > limit ? shown.at(-1)?.night ?? null : null,
    total,
  }
}
