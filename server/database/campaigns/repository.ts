import { and, asc, eq, gt, inArray, sql } from 'drizzle-orm'
import type { Queryable } from '../client'
import { campaigns, memberships } from './schema'

export type CampaignRow = typeof campaigns.$inferSelect

const ofUser = (userId: string, after: string | null) =>
  and(eq(memberships.userId, userId), after ? gt(campaigns.id, after) : undefined)

export const findCampaignsOfUser = (db: Queryable, userId: string, { after, limit }: { after: string | null, limit: number }) =>
  db.select({ campaign: campaigns, role: memberships.role })
    .from(campaigns)
    .innerJoin(memberships, eq(memberships.campaignId, campaigns.id))
    .where(ofUser(userId, after))
    .orderBy(asc(campaigns.id))
    .limit(limit)

export const countCampaignsOfUser = (db: Queryable, userId: string) => db.$count(memberships, eq(memberships.userId, userId))

export async function findCampaignById(db: Queryable, id: string): Promise<CampaignRow | undefined> {
  const [row] = await db.select().from(campaigns).where(eq(campaigns.id, id))
  return row
}

export async function findCampaignSlugs(db: Queryable, slugs: string[]): Promise<string[]> {
  const rows = await db.select({ slug: campaigns.slug }).from(campaigns).where(inArray(campaigns.slug, slugs))
  return rows.map(row => row.slug)
}

export async function insertCampaign(db: Queryable, row: typeof campaigns.$inferInsert): Promise<void> {
  await db.insert(campaigns).values(row)
}

export async function insertMembership(db: Queryable, row: typeof memberships.$inferInsert): Promise<void> {
  await db.insert(memberships).values(row)
}

type CampaignChange = Partial<Pick<CampaignRow, 'title' | 'kind' | 'description' | 'selfReview' | 'archivedAt'>>

/** False when the row is no longer at that version. */
export async function updateCampaign(db: Queryable, { id, version, change }: { id: string, version: number, change: CampaignChange }): Promise<boolean> {
  const [answer] = await db.update(campaigns)
    .set({ ...change, version: sql`${campaigns.version} + 1` })
    .where(and(eq(campaigns.id, id), eq(campaigns.version, version)))
  return answer.affectedRows === 1
}
