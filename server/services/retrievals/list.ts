import type { SQL } from 'drizzle-orm'
import type { RetrievalFilter, RetrievalListQuery } from '#shared/schemas/retrieval-list'
import type { Page, RetrievalRow } from '#shared/types/retrieval'
import { findCampaignIdsBySlugs } from '../../database/campaigns/access-queries'
import { database } from '../../database/client'
import { countRetrievals, filterCondition, readRetrievalPage } from '../../database/retrievals/list'
import type { Actor } from '../accounts/actor'
import { visibleCampaignIds } from '../campaigns/access'
import { cursorAfter, keysetOf } from './cursor'
import { rowView } from './view'

/** The caller's filter inside the campaigns that the caller may see. A campaign that is not theirs simply holds nothing. */
export async function visibleCondition(actor: Actor, filter: RetrievalFilter): Promise<SQL | undefined> {
  const visible = await visibleCampaignIds(actor)
  const wanted = filter.campaign.length > 0 ? await findCampaignIdsBySlugs(database(), filter.campaign) : visible
  return filterCondition(visible.filter(id => wanted.includes(id)), filter)
}

export async function listRetrievals(actor: Actor, query: RetrievalListQuery): Promise<Page<RetrievalRow>> {
  const keyset = keysetOf(query.sort, query.cursor)
  const where = await visibleCondition(actor, query)
  const [rows, total] = await Promise.all([
    readRetrievalPage(database(), { where, keyset, limit: query.limit + 1 }),
    countRetrievals(database(), where),
  ])
  const shown = rows.slice(0, query.limit)
  const last = shown.at(-1)
  return { items: shown.map(rowView), nextCursor: rows.length > query.limit && last ? cursorAfter(query.sort, last) : null, total }
}
