import type { InstrumentCreate, InstrumentView } from '#shared/schemas/instrument'
import { pageOf, type PageQuery } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countInstruments, findInstruments, findStationBySlug, insertInstrument, type InstrumentRow } from '../../database/campaigns/repository-equipment'
import { database } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { slugOf } from '../campaigns/slug'

const instrumentView = ({ campaignId: _, stationId: __, createdAt, ...instrument }: InstrumentRow, station: string | null): InstrumentView =>
  ({ ...instrument, station, createdAt: createdAt.toISOString() })

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
  const row: InstrumentRow = { id: newId(), campaignId: campaign.id, stationId, slug: wanted ?? (slugOf(input.name) || 'instrument'), ...input, createdAt: new Date(), version: 1 }
  try {
    await database().transaction(async (tx) => {
      await insertInstrument(tx, row)
      await writeLogbook(tx, { campaignId: campaign.id, objectKind: 'instrument', objectId: row.id, actorId: actor.userId, action: 'create', detail: { ...input, slug: row.slug, station } })
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw new DomainError('conflict', `This campaign has an instrument ${row.slug} already.`, [{ path: 'slug', message: 'This address is taken.' }])
    throw error
  }
  return instrumentView(row, station)
}

async function stationIdOf(campaignId: string, slug: string | null): Promise<string | null> {
  if (slug === null) return null
  const station = await findStationBySlug(database(), campaignId, slug)
  if (!station) throw new DomainError('validation_failed', `This campaign has no station ${slug}.`, [{ path: 'station', message: 'No such station in this campaign.' }])
  return station.id
}
