import { count, desc, eq, sql } from 'drizzle-orm'
import { campaigns } from '../campaigns/schema'
import type { Queryable } from '../client'
import { spectra } from './schema'

/** Stored bytes and files of every campaign, the largest first. */
export function usageByCampaign(db: Queryable): Promise<{ slug: string, title: string, archivedAt: Date | null, files: number, bytes: number }[]> {
  const bytes = sql<number>`coalesce(sum(${spectra.byteCount}), 0)`.mapWith(Number)
  return db.select({ slug: campaigns.slug, title: campaigns.title, archivedAt: campaigns.archivedAt, files: count(spectra.id), bytes }).from(campaigns)
    .leftJoin(spectra, eq(spectra.campaignId, campaigns.id))
    .groupBy(campaigns.id, campaigns.slug, campaigns.title, campaigns.archivedAt).orderBy(desc(bytes), campaigns.title)
}
