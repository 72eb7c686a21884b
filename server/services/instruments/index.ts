import type { InstrumentCreate, InstrumentView } from '#shared/schemas/instrument'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { countInstruments, findInstrumentBySlug, findInstruments, insertInstrument, type InstrumentRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import { newId } from '../../database/ids'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugFor, storeNew } from '../campaigns/store-new'
import { stationIdOf } from './station-of'
import { instrumentView } from './view'

export async function listInstruments(actor: Actor, slug: string, query: PageQuery): Promise<Page<InstrumentView>> {
  const { campaign } = await campaignFor(actor, slug, 'see')
  const db = database()
  const [rows, total] = await Promise.all([
    findInstruments(db, campaign.id, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countInstruments(db, campaign.id),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.instrument.id, view: row => instrumentView(row.instrument, row.station) })
}

export async function createInstrument(actor: Actor, slug: string, { slug: wanted, station, ...input }: InstrumentCreate): Promise<InstrumentView> {
  const { campaign } = await campaignFor(actor, slug, 'edit-equipment')
  const stationId = await stationIdOf(campaign.id, station)
  const isTaken = async (candidate: string) => await findInstrumentBySlug(database(), campaign.id, candidate) !== undefined
  const address = wanted ?? await slugFor(input.name, 'instrument', isTaken)
  const row: InstrumentRow = { id: newId(), campaignId: campaign.id, stationId, slug: address, ...input, archivedAt: null, createdAt: new Date(), version: 1 }
  await storeNew(actor, 'instrument', row, { ...input, slug: row.slug, station }, tx => insertInstrument(tx, row))
  return instrumentView(row, station)
}
