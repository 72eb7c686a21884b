import { and, eq, inArray, isNotNull, or, sql, type SQL } from 'drizzle-orm'
import type { CampaignRole } from '#shared/types/roles'
import type { Queryable } from '../client'
import { campaigns, formerCampaignSlugs, memberships } from './schema'

export type CampaignRow = typeof campaigns.$inferSelect
/** `member` false: a campaign that every account of the service may read, seen by one that does not belong to it. */
export interface CampaignAccess { campaign: CampaignRow, role: CampaignRole, member: boolean }

type Target = { userId: string, slug: string } | { userId: string, campaignId: string }

/** A member has the role of their membership; whoever else may read the campaign is its Reader, and nothing more. */
export const roleOf = (role: CampaignRole | null): { role: CampaignRole, member: boolean } => ({ role: role ?? 'reader', member: role !== null })

/** What the account may look into: its own campaigns, and those open to every account. Goes with `membershipOf`. */
export const visibleTo = (): SQL | undefined => or(isNotNull(memberships.role), eq(campaigns.visibility, 'service'))

export const membershipOf = (userId: string): SQL | undefined => and(eq(memberships.campaignId, campaigns.id), eq(memberships.userId, userId))

/** The campaign with the caller's role in it; nothing for who may not see it. A former slug finds it too. */
export async function findCampaignForMember(db: Queryable, where: Target): Promise<CampaignAccess | undefined> {
  if (!('slug' in where)) return findVisible(db, where.userId, eq(campaigns.id, where.campaignId))
  return await findVisible(db, where.userId, eq(campaigns.slug, where.slug)) ?? findByFormerSlug(db, where)
}

async function findByFormerSlug(db: Queryable, { userId, slug }: { userId: string, slug: string }): Promise<CampaignAccess | undefined> {
  const [former] = await db.select({ id: formerCampaignSlugs.campaignId }).from(formerCampaignSlugs).where(eq(formerCampaignSlugs.slug, slug))
  return former && findVisible(db, userId, eq(campaigns.id, former.id))
}

async function findVisible(db: Queryable, userId: string, target: SQL): Promise<CampaignAccess | undefined> {
  const [row] = await db.select({ campaign: campaigns, role: memberships.role }).from(campaigns)
    .leftJoin(memberships, membershipOf(userId))
    .where(and(target, visibleTo())).limit(1)
  return row && { campaign: row.campaign, ...roleOf(row.role) }
}

/** Every campaign the account is a member of, with its role. */
export const listMemberships = (db: Queryable, userId: string): Promise<{ campaignId: string, role: CampaignRole }[]> =>
  db.select({ campaignId: memberships.campaignId, role: memberships.role }).from(memberships).where(eq(memberships.userId, userId))

/** Every campaign whose content the account may read, as member or because every account may. */
export async function listVisibleCampaignIds(db: Queryable, userId: string): Promise<string[]> {
  const rows = await db.select({ id: campaigns.id }).from(campaigns).leftJoin(memberships, membershipOf(userId)).where(visibleTo())
  return rows.map(row => row.id)
}

/** Ids of the campaigns that have, or once had, one of these slugs. */
export async function findCampaignIdsBySlugs(db: Queryable, slugs: string[]): Promise<string[]> {
  if (slugs.length === 0) return []
  const rows = await db.select({ id: campaigns.id }).from(campaigns)
    .where(or(inArray(campaigns.slug, slugs), sql`${campaigns.id} in (select ${formerCampaignSlugs.campaignId} from ${formerCampaignSlugs} where ${inArray(formerCampaignSlugs.slug, slugs)})`))
  return rows.map(row => row.id)
}
