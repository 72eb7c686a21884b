import { and, desc, eq, isNotNull, isNull, lt, sql } from 'drizzle-orm'
import { users } from '../accounts/schema'
import { campaigns } from '../campaigns/schema'
import type { Queryable } from '../client'
import { invitations } from './schema'

export type InvitationRow = typeof invitations.$inferSelect
export interface ListedInvitation { invitation: InvitationRow, invitedByName: string }
export interface InvitationToAnswer extends ListedInvitation { campaign: { slug: string, title: string } | null }

export async function insertInvitation(db: Queryable, row: InvitationRow): Promise<void> {
  await db.insert(invitations).values(row)
}

const inPlace = (campaignId: string | null) => campaignId === null ? isNull(invitations.campaignId) : eq(invitations.campaignId, campaignId)
/** Neither accepted nor withdrawn; it may be too old. */
const isOpen = isNotNull(invitations.openKey)

const listed = (db: Queryable) => db.select({ invitation: invitations, invitedByName: users.name }).from(invitations).innerJoin(users, eq(users.id, invitations.invitedBy))

/** Of a campaign, or of the service for null; the newest first. */
export const findInvitations = (db: Queryable, campaignId: string | null, { before, limit }: { before: string | null, limit: number }): Promise<ListedInvitation[]> =>
  listed(db).where(and(inPlace(campaignId), before ? lt(invitations.id, before) : undefined)).orderBy(desc(invitations.id)).limit(limit)

export const countInvitations = (db: Queryable, campaignId: string | null) => db.$count(invitations, inPlace(campaignId))

export async function findInvitation(db: Queryable, campaignId: string | null, id: string): Promise<ListedInvitation | undefined> {
  const [row] = await listed(db).where(and(inPlace(campaignId), eq(invitations.id, id)))
  return row
}

const answerable = (db: Queryable) => db.select({ invitation: invitations, invitedByName: users.name, campaign: { slug: campaigns.slug, title: campaigns.title } }).from(invitations)
  .innerJoin(users, eq(users.id, invitations.invitedBy))
  .leftJoin(campaigns, eq(campaigns.id, invitations.campaignId))

export async function findInvitationById(db: Queryable, id: string): Promise<InvitationToAnswer | undefined> {
  const [row] = await answerable(db).where(eq(invitations.id, id))
  return row
}

export async function findInvitationByToken(db: Queryable, tokenHash: string): Promise<InvitationToAnswer | undefined> {
  const [row] = await answerable(db).where(eq(invitations.tokenHash, tokenHash))
  return row
}

/** A new link for one that is open, if nobody sent it anew or closed it since `round`. */
export async function renewInvitation(db: Queryable, { id, round }: Pick<InvitationRow, 'id' | 'round'>, next: Pick<InvitationRow, 'tokenHash' | 'sentAt' | 'expiresAt'>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(invitations).set({ ...next, round: sql`${invitations.round} + 1` })
    .where(and(eq(invitations.id, id), eq(invitations.round, round), isOpen))
  return affectedRows === 1
}

export async function withdrawInvitation(db: Queryable, id: string): Promise<boolean> {
  const [{ affectedRows }] = await db.update(invitations).set({ openKey: null, withdrawnAt: new Date() }).where(and(eq(invitations.id, id), isOpen))
  return affectedRows === 1
}

/** Closes it for whoever comes first. */
export async function closeAsAccepted(db: Queryable, { id, tokenHash }: Pick<InvitationRow, 'id' | 'tokenHash'>, userId: string): Promise<boolean> {
  const now = new Date()
  const [{ affectedRows }] = await db.update(invitations).set({ openKey: null, acceptedAt: now, acceptedBy: userId })
    .where(and(eq(invitations.id, id), eq(invitations.tokenHash, tokenHash), isOpen, sql`${invitations.expiresAt} > ${now}`))
  return affectedRows === 1
}
