import { stationFormSchema, type StationPatch, type StationView } from '#shared/schemas/station'
import type { CampaignAction } from '#shared/types/roles'
import { DomainError } from '#shared/utils/domain-error'
import { findStation, findStationBySlug, updateStation, type StationRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { changeRow, setArchived, type EditableKind } from '../campaigns/change-row'
import { refuseProblems } from '../campaigns/refuse-problems'
import { stationView } from './view'

export interface StationAddress { slug: string, station: string }

const editable: EditableKind<StationRow> = { kind: 'station', read: findStation, update: updateStation, view: stationView }

/** The station, for whoever may do this in its campaign. */
export async function stationFor(actor: Actor, { slug, station }: StationAddress, action: CampaignAction): Promise<StationRow> {
  const { campaign } = await campaignFor(actor, slug, action)
  const row = await findStationBySlug(database(), campaign.id, station)
  if (!row) throw new DomainError('not_found', `The campaign has no station ${station}.`)
  return row
}

export const readStation = async (actor: Actor, address: StationAddress): Promise<StationView> => stationView(await stationFor(actor, address, 'see'))

export async function changeStation(actor: Actor, address: StationAddress, { version, slug: _, ...wanted }: StationPatch): Promise<StationView> {
  const row = await stationFor(actor, address, 'edit-equipment')
  const { slug, name, latitude, longitude, altitude } = row
  if (version === row.version) refuseProblems(stationFormSchema, { slug, name, latitude, longitude, altitude, ...wanted })
  return stationView(await changeRow(editable, { actor, campaignId: row.campaignId, id: row.id }, version, wanted))
}

export async function archiveStation(actor: Actor, address: StationAddress, archived: boolean): Promise<StationView> {
  const row = await stationFor(actor, address, 'edit-equipment')
  return stationView(await setArchived(editable, { actor, campaignId: row.campaignId, id: row.id }, archived))
}
