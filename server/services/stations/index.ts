import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { StationCreate, StationView } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'
import { countStations, findStationBySlug, findStations, insertStation, type StationRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import { newId } from '../../database/ids'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugFor, storeNew } from '../campaigns/store-new'
import { stationView } from './view'

export async function listStations(actor: Actor, slug: string, query: PageQuery): Promise<Page<StationView>> {
  const { campaign } = await campaignFor(actor, slug, 'see')
  const db = database()
  const [rows, total] = await Promise.all([
    findStations(db, campaign.id, { after: query.cursor ?? null, limit: query.limit + 1 }),
    countStations(db, campaign.id),
  ])
  return pageOf(rows, { limit: query.limit, total, id: row => row.id, view: stationView })
}

export async function createStation(actor: Actor, slug: string, { slug: wanted, ...input }: StationCreate): Promise<StationView> {
  const { campaign } = await campaignFor(actor, slug, 'edit-equipment')
  const isTaken = async (candidate: string) => await findStationBySlug(database(), campaign.id, candidate) !== undefined
  const address = wanted ?? await slugFor(input.name, 'station', isTaken)
  const row: StationRow = { id: newId(), campaignId: campaign.id, slug: address, ...input, archivedAt: null, createdAt: new Date(), version: 1 }
  await storeNew(actor, 'station', row, { ...input, slug: row.slug }, tx => insertStation(tx, row))
  return stationView(row)
}
