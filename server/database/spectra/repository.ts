import { and, asc, count, desc, eq, gt, inArray, isNotNull, isNull, type SQL } from 'drizzle-orm'
import { campaigns } from '../campaigns/schema'
import { retrievals } from '../retrievals/schema'
import type { Queryable, Transaction } from '../client'
import { spectra } from './schema'

export type SpectrumRow = typeof spectra.$inferSelect

export async function findSpectrumBySha(db: Queryable, campaignId: string, sha256: string): Promise<SpectrumRow | undefined> {
  const [row] = await db.select().from(spectra).where(and(eq(spectra.campaignId, campaignId), eq(spectra.sha256, sha256)))
  return row
}

export async function findSpectrumById(db: Queryable, id: string): Promise<{ spectrum: SpectrumRow, campaign: string } | undefined> {
  const [row] = await db.select({ spectrum: spectra, campaign: campaigns.slug })
    .from(spectra)
    .innerJoin(campaigns, eq(campaigns.id, spectra.campaignId))
    .where(eq(spectra.id, id))
  return row
}

/** `problem`: only those that need mending, or only the others; null: all. */
export interface SpectraWanted { campaignId: string, problem: boolean | null }
const wantedSpectra = ({ campaignId, problem }: SpectraWanted): SQL | undefined =>
  and(eq(spectra.campaignId, campaignId), problem === null ? undefined : problem ? isNotNull(spectra.problem) : isNull(spectra.problem))

export const findSpectra = (db: Queryable, wanted: SpectraWanted, { after, limit }: { after: string | null, limit: number }): Promise<SpectrumRow[]> =>
  db.select().from(spectra)
    .where(and(wantedSpectra(wanted), after ? gt(spectra.id, after) : undefined))
    .orderBy(asc(spectra.id))
    .limit(limit)

export const countSpectra = (db: Queryable, wanted: SpectraWanted) => db.$count(spectra, wantedSpectra(wanted))

/** One person's files that need mending, the newest first. */
export async function findMineToMend(db: Queryable, { userId, campaignIds, limit }: { userId: string, campaignIds: string[], limit: number }): Promise<{ items: { spectrum: SpectrumRow, campaign: string }[], total: number }> {
  if (campaignIds.length === 0) return { items: [], total: 0 }
  const mine = and(eq(spectra.ownerId, userId), inArray(spectra.campaignId, campaignIds), isNotNull(spectra.problem))
  const [items, total] = await Promise.all([
    db.select({ spectrum: spectra, campaign: campaigns.slug }).from(spectra).innerJoin(campaigns, eq(campaigns.id, spectra.campaignId))
      .where(mine).orderBy(desc(spectra.id)).limit(limit),
    db.$count(spectra, mine),
  ])
  return { items, total }
}

export async function insertSpectrum(db: Queryable, row: typeof spectra.$inferInsert): Promise<void> {
  await db.insert(spectra).values(row)
}

/** Changes a spectrum, if nobody else did since `version`. */
export async function updateSpectrum(db: Queryable, { id, version }: { id: string, version: number }, change: Partial<typeof spectra.$inferInsert>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(spectra).set({ ...change, version: version + 1 }).where(and(eq(spectra.id, id), eq(spectra.version, version)))
  return affectedRows === 1
}

/** Whether a row speaks of these bytes; until the transaction ends nobody can add one. */
export async function lockSpectrumBytes(tx: Transaction, campaignId: string, sha256: string): Promise<boolean> {
  const rows = await tx.select({ id: spectra.id }).from(spectra).where(and(eq(spectra.campaignId, campaignId), eq(spectra.sha256, sha256))).for('update')
  return rows.length > 0
}

export async function countRetrievalsOf(db: Queryable, spectrumId: string): Promise<number> {
  const [row] = await db.select({ found: count() }).from(retrievals).where(eq(retrievals.spectrumId, spectrumId))
  return row?.found ?? 0
}

/** Only a file that needs mending can go. */
export async function deleteUnreadable(db: Queryable, { id, version }: { id: string, version: number }): Promise<boolean> {
  const [{ affectedRows }] = await db.delete(spectra).where(and(eq(spectra.id, id), eq(spectra.version, version), isNotNull(spectra.problem)))
  return affectedRows === 1
}
