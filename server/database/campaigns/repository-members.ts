import { and, asc, eq, inArray, isNull, ne, sql } from 'drizzle-orm'
import type { CampaignRole } from '#shared/types/roles'
import { users } from '../accounts/schema'
import type { Queryable, Transaction } from '../client'
import { campaigns, memberships } from './schema'

const memberColumns = {
  userId: users.id, name: users.name, email: users.email, deactivatedAt: users.deactivatedAt, role: memberships.role, createdAt: memberships.createdAt, version: memberships.version,
}
const members = (db: Queryable) => db.select(memberColumns).from(memberships).innerJoin(users, eq(users.id, memberships.userId))
const memberIs = (campaignId: string, userId: string) => and(eq(memberships.campaignId, campaignId), eq(memberships.userId, userId))

export type MemberRow = Awaited<ReturnType<typeof findMembers>>[number]

export const findMembers = (db: Queryable, campaignId: string, { after, limit }: { after: string | null, limit: number }) =>
  members(db).where(and(eq(memberships.campaignId, campaignId), after ? sql`${users.id} > ${after}` : undefined)).orderBy(asc(users.id)).limit(limit)

export const countMembers = (db: Queryable, campaignId: string) => db.$count(memberships, eq(memberships.campaignId, campaignId))

export async function findMember(db: Queryable, campaignId: string, userId: string): Promise<MemberRow | undefined> {
  const [row] = await members(db).where(memberIs(campaignId, userId))
  return row
}

/** Members are changed one after the other, so that two leads cannot go at once. */
export async function lockCampaigns(tx: Transaction, ids: string[]): Promise<void> {
  if (ids.length > 0) await tx.select({ id: campaigns.id }).from(campaigns).where(inArray(campaigns.id, ids)).orderBy(asc(campaigns.id)).for('update')
}

/** Leads who can act: those whose account is not deactivated. */
export const countOtherLeads = async (db: Queryable, campaignId: string, userId: string): Promise<number> => {
  const rows = await db.select({ id: users.id }).from(memberships).innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.campaignId, campaignId), eq(memberships.role, 'lead'), ne(memberships.userId, userId), isNull(users.deactivatedAt)))
  return rows.length
}

export const findCampaignsLedBy = (db: Queryable, userId: string): Promise<{ id: string, slug: string, title: string }[]> =>
  db.select({ id: campaigns.id, slug: campaigns.slug, title: campaigns.title }).from(campaigns)
    .innerJoin(memberships, eq(memberships.campaignId, campaigns.id))
    .where(and(eq(memberships.userId, userId), eq(memberships.role, 'lead'))).orderBy(asc(campaigns.id))

/** @returns false when the membership has moved on from `version` */
export async function updateRole(db: Queryable, { campaignId, userId, version }: { campaignId: string, userId: string, version: number }, role: CampaignRole): Promise<boolean> {
  const [{ affectedRows }] = await db.update(memberships).set({ role, version: sql`${memberships.version} + 1` })
    .where(and(memberIs(campaignId, userId), eq(memberships.version, version)))
  return affectedRows === 1
}

/** @returns false when the membership has moved on from `version` */
export async function deleteMembership(db: Queryable, { campaignId, userId, version }: { campaignId: string, userId: string, version: number }): Promise<boolean> {
  const [{ affectedRows }] = await db.delete(memberships).where(and(memberIs(campaignId, userId), eq(memberships.version, version)))
  return affectedRows === 1
}
