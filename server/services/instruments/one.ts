import { instrumentFormSchema, type InstrumentPatch, type InstrumentView } from '#shared/schemas/instrument'
import type { CampaignAction } from '#shared/types/roles'
import { DomainError } from '#shared/utils/domain-error'
import { findInstrument, findInstrumentBySlug, updateInstrument, type InstrumentRow } from '../../database/campaigns/repository-equipment'
import { database, type Queryable } from '../../database/client'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { changeRow, setArchived, type EditableKind } from '../campaigns/change-row'
import type { Changes } from '../campaigns/changes'
import { refuseProblems } from '../campaigns/refuse-problems'
import { stationIdOf, stationSlugOf } from './station-of'
import { instrumentView } from './view'

export interface InstrumentAddress { slug: string, instrument: string }

const view = async (row: InstrumentRow): Promise<InstrumentView> => instrumentView(row, await stationSlugOf(database(), row.stationId))

/** The logbook names stations, not their ids. */
async function inWords(db: Queryable, { stationId, ...changes }: Changes): Promise<Changes> {
  if (!stationId) return changes
  const [from, to] = await Promise.all([stationId.from, stationId.to].map(id => stationSlugOf(db, id as string | null)))
  return { ...changes, station: { from, to } }
}

const editable: EditableKind<InstrumentRow> = { kind: 'instrument', read: findInstrument, update: updateInstrument, view, inWords }

async function instrumentFor(actor: Actor, { slug, instrument }: InstrumentAddress, action: CampaignAction): Promise<InstrumentRow> {
  const { campaign } = await campaignFor(actor, slug, action)
  const row = await findInstrumentBySlug(database(), campaign.id, instrument)
  if (!row) throw new DomainError('not_found', `The campaign has no instrument ${instrument}.`)
  return row
}

export const readInstrument = async (actor: Actor, address: InstrumentAddress): Promise<InstrumentView> => view(await instrumentFor(actor, address, 'see'))

export async function changeInstrument(actor: Actor, address: InstrumentAddress, { version, slug: _, station, ...wanted }: InstrumentPatch): Promise<InstrumentView> {
  const row = await instrumentFor(actor, address, 'edit-equipment')
  const now = await view(row)
  if (version === row.version) refuseProblems(instrumentFormSchema, { ...formOf(now), ...wanted })
  const moved = station === undefined || station === now.station ? {} : { stationId: await stationIdOf(row.campaignId, station) }
  return view(await changeRow(editable, { actor, campaignId: row.campaignId, id: row.id }, version, { ...wanted, ...moved }))
}

export async function archiveInstrument(actor: Actor, address: InstrumentAddress, archived: boolean): Promise<InstrumentView> {
  const row = await instrumentFor(actor, address, 'edit-equipment')
  return view(await setArchived(editable, { actor, campaignId: row.campaignId, id: row.id }, archived))
}

const formOf = ({ id: _, archivedAt: __, createdAt: ___, version: ____, ...form }: InstrumentView) => form
