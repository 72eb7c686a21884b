import type { SpectrumAbout } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { findInstrumentBySlug, findStationBySlug, type InstrumentRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'

export interface Place { stationId: string | null, instrument: InstrumentRow | null }

/** Station and instrument that were named; a name the campaign does not have is refused, never dropped. */
export async function placeOf(campaignId: string, { station, instrument }: Partial<SpectrumAbout>): Promise<Place> {
  const [stationRow, instrumentRow] = await Promise.all([
    station ? findStationBySlug(database(), campaignId, station) : undefined,
    instrument ? findInstrumentBySlug(database(), campaignId, instrument) : undefined,
  ])
  if (station && !stationRow) throw unknownName('station', station)
  if (instrument && !instrumentRow) throw unknownName('instrument', instrument)
  return { stationId: stationRow?.id ?? instrumentRow?.stationId ?? null, instrument: instrumentRow ?? null }
}

const unknownName = (kind: string, name: string) =>
  new DomainError('validation_failed', `This campaign has no ${kind} ${name}.`, [{ path: `about.${kind}`, message: `No such ${kind} in this campaign.` }])
