import { and, asc, count, eq, gt, sql } from 'drizzle-orm'
import type { Queryable } from '../client'
import { membershipOf, visibleTo } from './access-queries'
import { campaigns, memberships } from './schema'

export type CampaignRow = typeof campaigns.$inferSelect

/** What the account may see; the role is null where it is no member. */
export const findVisibleCampaigns = (db: Queryable, userId: string, { after, limit }: { after: string | null, limit: number }) =>
  db.select({ campaign: campaigns, role: memberships.role })
    .from(campaigns)
    .leftJoin(memberships, membershipOf(userId))
    .where(and(visibleTo(), after ? gt(campaigns.id, after) : undefined))
    .orderBy(asc(campaigns.id))
    .limit(limit)

export async function countVisibleCampaigns(db: Queryable, userId: string): Promise<number> {
  const [row] = await db.select({ count: count() }).from(campaigns).leftJoin(memberships, membershipOf(userId)).where(visibleTo())
  return row?.count ?? 0
}

export async function findCampaignById(db: Queryable, id: string): Promise<CampaignRow | undefined> {
  const [row] = await db.select().from(campaigns).where(eq(campaigns.id, id))
  return row
}

export async function insertCampaign(db: Queryable, row: typeof campaigns.$inferInsert): Promise<void> {
  await db.insert(campaigns).values(row)
}

export async function insertMembership(db: Queryable, row: typeof memberships.$inferInsert): Promise<void> {
  await db.insert(memberships).values(row)
}

type CampaignChange = Partial<Omit<CampaignRow, 'id' | 'createdAt' | 'version'>>

/** False when the row is no longer at that version. */
export async function updateCampaign(db: Queryable, { id, version, change }: { id: string, version: number, change: CampaignChange }): Promise<boolean> {
  const [answer] = await db.update(campaigns)
    .set({ ...change, version: sql`${campaigns.version} + 1` })
    .where(and(eq(campaigns.id, id), eq(campaigns.version, version)))
  return answer.affectedRows === 1
}
