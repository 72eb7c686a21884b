import { DomainError } from '#shared/utils/domain-error'
import { findStation, findStationBySlug } from '../../database/campaigns/repository-equipment'
import { database, type Queryable } from '../../database/client'

/** The id of the station that an instrument is said to stand at. */
export async function stationIdOf(campaignId: string, slug: string | null): Promise<string | null> {
  if (slug === null) return null
  const station = await findStationBySlug(database(), campaignId, slug)
  if (!station) throw new DomainError('validation_failed', `This campaign has no station ${slug}.`, [{ path: 'station', message: 'No such station in this campaign.' }])
  if (station.archivedAt) throw new DomainError('archived', `The station ${station.name} is archived; bring it back before an instrument is put there.`, [{ path: 'station', message: 'This station is archived.' }])
  return station.id
}

export const stationSlugOf = async (db: Queryable, stationId: string | null): Promise<string | null> =>
  stationId === null ? null : (await findStation(db, stationId))?.slug ?? null
