import type { SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { findInstrumentBySlug, findStation, findStationBySlug, type InstrumentRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import { refuseArchivedPlace } from './refuse-archived-place'

export interface Place { stationId: string | null, instrument: InstrumentRow | null }
interface Naming {
  /** Where the request names them. @default 'about' */
  within?: string
  /** What it was at before: that may be archived. */
  keeps?: { stationId: string | null, instrumentId: string | null }
}

/** Station and instrument that were named; a name the campaign does not have, or has archived, is refused, never dropped. */
export async function placeOf(campaignId: string, { station, instrument }: Partial<SpectrumAbout>, { within = 'about', keeps }: Naming = {}): Promise<Place> {
  const db = database()
  const [namedStation, instrumentRow] = await Promise.all([
    station ? findStationBySlug(db, campaignId, station) : undefined,
    instrument ? findInstrumentBySlug(db, campaignId, instrument) : undefined,
  ])
  if (station && !namedStation) throw unknownName(within, 'station', station)
  if (instrument && !instrumentRow) throw unknownName(within, 'instrument', instrument)
  const stationRow = namedStation ?? (instrumentRow?.stationId ? await findStation(db, instrumentRow.stationId) : undefined)
  refuseArchivedPlace(within, {
    station: stationRow?.id === keeps?.stationId ? undefined : stationRow,
    instrument: instrumentRow?.id === keeps?.instrumentId ? undefined : instrumentRow,
  })
  return { stationId: stationRow?.id ?? null, instrument: instrumentRow ?? null }
}

const unknownName = (within: string, kind: string, name: string) =>
  new DomainError('validation_failed', `This campaign has no ${kind} ${name}.`, [{ path: `${within}.${kind}`, message: `No such ${kind} in this campaign.` }])
