import { and, asc, desc, eq, inArray, ne } from 'drizzle-orm'
import { users } from '../accounts/schema'
import type { Queryable } from '../client'
import { spectra } from '../spectra/schema'
import type { RetrievalRecord } from './claim'
import { retrievalResults, retrievals, reviews } from './schema'

export type ResultRecord = typeof retrievalResults.$inferSelect

export async function findRetrieval(db: Queryable, id: string): Promise<RetrievalRecord | undefined> {
  const [row] = await db.select().from(retrievals).where(eq(retrievals.id, id))
  return row
}

/** The newest finished revision that has something to show; an aborted one shows what was there before. */
export async function findShownResult(db: Queryable, retrievalId: string): Promise<ResultRecord | undefined> {
  const [row] = await db.select().from(retrievalResults)
    .where(and(eq(retrievalResults.retrievalId, retrievalId), ne(retrievalResults.phase, 'ABORTED')))
    .orderBy(desc(retrievalResults.revision)).limit(1)
  return row
}

export async function findResult(db: Queryable, retrievalId: string, revision: number): Promise<ResultRecord | undefined> {
  const [row] = await db.select().from(retrievalResults)
    .where(and(eq(retrievalResults.retrievalId, retrievalId), eq(retrievalResults.revision, revision)))
  return row
}

export const findRevisions = (db: Queryable, retrievalId: string) =>
  db.select({ result: retrievalResults, createdBy: users.name }).from(retrievalResults)
    .innerJoin(users, eq(users.id, retrievalResults.createdBy))
    .where(eq(retrievalResults.retrievalId, retrievalId)).orderBy(asc(retrievalResults.revision))

export const findReviews = (db: Queryable, retrievalId: string) =>
  db.select({ review: reviews, reviewer: users.name }).from(reviews)
    .innerJoin(users, eq(users.id, reviews.reviewerId))
    .where(eq(reviews.retrievalId, retrievalId)).orderBy(asc(reviews.createdAt))

/** What a submission must know of each spectrum it names. */
export const findSpectraForSubmission = (db: Queryable, campaignId: string, ids: string[]) =>
  db.select({
    id: spectra.id, name: spectra.name, missing: spectra.missing, problem: spectra.problem, observedAt: spectra.observedAt,
    stationId: spectra.stationId, instrumentId: spectra.instrumentId,
  }).from(spectra).where(and(eq(spectra.campaignId, campaignId), inArray(spectra.id, ids)))

export async function findSpectrum(db: Queryable, id: string): Promise<typeof spectra.$inferSelect | undefined> {
  const [row] = await db.select().from(spectra).where(eq(spectra.id, id))
  return row
}
