import { and, eq, inArray, ne } from 'drizzle-orm'
import type { Queryable } from '../client'
import { campaigns, formerCampaignSlugs } from './schema'

/** Which of these lead to a campaign, now or since former times. */
export async function findTakenSlugs(db: Queryable, slugs: string[]): Promise<string[]> {
  const [now, before] = await Promise.all([
    db.select({ slug: campaigns.slug }).from(campaigns).where(inArray(campaigns.slug, slugs)),
    db.select({ slug: formerCampaignSlugs.slug }).from(formerCampaignSlugs).where(inArray(formerCampaignSlugs.slug, slugs)),
  ])
  return [...now, ...before].map(row => row.slug)
}

/**
 * Did another campaign have this slug before? Asked after the row with the slug was written: whoever gave it up has
 * committed by then, and a locking read sees that.
 */
export async function isFormerSlugOfAnother(db: Queryable, { slug, campaignId }: { slug: string, campaignId: string }): Promise<boolean> {
  const rows = await db.select({ slug: formerCampaignSlugs.slug }).from(formerCampaignSlugs)
    .where(and(eq(formerCampaignSlugs.slug, slug), ne(formerCampaignSlugs.campaignId, campaignId))).for('update')
  return rows.length > 0
}

/** The old slug leads to the campaign from now on; the new one, if it was a former one of its own, no longer needs to. */
export async function keepFormerSlug(db: Queryable, { campaignId, from, to }: { campaignId: string, from: string, to: string }): Promise<void> {
  await db.delete(formerCampaignSlugs).where(and(eq(formerCampaignSlugs.slug, to), eq(formerCampaignSlugs.campaignId, campaignId)))
  await db.insert(formerCampaignSlugs).values({ slug: from, campaignId, createdAt: new Date() })
}
