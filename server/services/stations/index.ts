import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { StationCreate, StationView } from '#shared/schemas/station'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countStations, findStations, insertStation, type StationRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugOf } from '../campaigns/slug'

const stationView = ({ campaignId: _, createdAt, ...station }: StationRow): StationView => ({ ...station, createdAt: createdAt.toISOString() })

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
  const row: StationRow = { id: newId(), campaignId: campaign.id, slug: wanted ?? (slugOf(input.name) || 'station'), ...input, createdAt: new Date(), version: 1 }
  try {
    await database().transaction(async (tx) => {
      await insertStation(tx, row)
      await writeLogbook(tx, { campaignId: campaign.id, objectKind: 'station', objectId: row.id, actorId: actor.userId, action: 'create', detail: { slug: row.slug, name: row.name } })
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw new DomainError('conflict', `This campaign has a station ${row.slug} already.`, [{ path: 'slug', message: 'This address is taken.' }])
    throw error
  }
  return stationView(row)
}
