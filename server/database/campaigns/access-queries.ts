import { and, eq } from 'drizzle-orm'
import type { CampaignRole } from '#shared/types/roles'
import type { Queryable } from '../client'
import { campaigns, memberships } from './schema'

export type CampaignRow = typeof campaigns.$inferSelect
export interface CampaignAccess { campaign: CampaignRow, role: CampaignRole }

/** The campaign with the caller's role in it; nothing for who is not a member. */
export async function findCampaignForMember(db: Queryable, where: { userId: string, slug: string } | { userId: string, campaignId: string }): Promise<CampaignAccess | undefined> {
  const target = 'slug' in where ? eq(campaigns.slug, where.slug) : eq(campaigns.id, where.campaignId)
  const [row] = await db.select({ campaign: campaigns, role: memberships.role }).from(campaigns)
    .innerJoin(memberships, and(eq(memberships.campaignId, campaigns.id), eq(memberships.userId, where.userId)))
    .where(target).limit(1)
  return row
}

/** Every campaign the account is a member of, with its role. */
export const listMemberships = (db: Queryable, userId: string): Promise<{ campaignId: string, role: CampaignRole }[]> =>
  db.select({ campaignId: memberships.campaignId, role: memberships.role }).from(memberships).where(eq(memberships.userId, userId))
