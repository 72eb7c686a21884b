import { and, asc, eq, gt } from 'drizzle-orm'
import { campaigns } from '../campaigns/schema'
import type { Queryable } from '../client'
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

export const findSpectra = (db: Queryable, campaignId: string, { after, limit }: { after: string | null, limit: number }): Promise<SpectrumRow[]> =>
  db.select().from(spectra)
    .where(and(eq(spectra.campaignId, campaignId), after ? gt(spectra.id, after) : undefined))
    .orderBy(asc(spectra.id))
    .limit(limit)

export const countSpectra = (db: Queryable, campaignId: string) => db.$count(spectra, eq(spectra.campaignId, campaignId))

export async function insertSpectrum(db: Queryable, row: typeof spectra.$inferInsert): Promise<void> {
  await db.insert(spectra).values(row)
}

/** Changes what is said of a spectrum, if nobody else did since `version`. */
export async function updateSpectrumAbout(db: Queryable, { id, version }: { id: string, version: number }, change: Partial<typeof spectra.$inferInsert>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(spectra).set({ ...change, version: version + 1 }).where(and(eq(spectra.id, id), eq(spectra.version, version)))
  return affectedRows === 1
}
