import { and, asc, desc, eq, gte, inArray, isNull, like, lt, or, sql, type SQL } from 'drizzle-orm'
import { flagsToBits } from '../../../shared/engine/flags'
import type { RetrievalFilter } from '../../../shared/schemas/retrieval-list'
import { users } from '../accounts/schema'
import { campaigns, instruments, recipes, stations } from '../campaigns/schema'
import type { Queryable } from '../client'
import { containing } from '../containing'
import { keysetAfter, orderOf, type Keyset } from './keyset'
import { retrievals } from './schema'

/** Columns of one table row, with the names that stand for its ids. */
const columns = {
  id: retrievals.id, name: retrievals.name, campaignId: retrievals.campaignId, campaignSlug: campaigns.slug, campaignTitle: campaigns.title,
  batchId: retrievals.batchId, ownerId: retrievals.ownerId, owner: users.name, station: stations.name, instrument: instruments.name,
  recipeSlug: recipes.slug, recipeVersion: recipes.version, band: retrievals.band, observedAt: retrievals.observedAt, createdAt: retrievals.createdAt,
  finishedAt: retrievals.finishedAt, revision: retrievals.revision, phase: retrievals.phase, progress: retrievals.progress, reason: retrievals.reason,
  temperature: retrievals.temperature, uNoise: retrievals.uNoise, uSystematic: retrievals.uSystematic, strengthSet: retrievals.strengthSet,
  flagBits: retrievals.flagBits, verdict: retrievals.verdict,
}

const rows = (db: Queryable) => db.select(columns).from(retrievals)
  .innerJoin(campaigns, eq(campaigns.id, retrievals.campaignId))
  .innerJoin(users, eq(users.id, retrievals.ownerId))
  .leftJoin(stations, eq(stations.id, retrievals.stationId))
  .leftJoin(instruments, eq(instruments.id, retrievals.instrumentId))
  .leftJoin(recipes, eq(recipes.id, retrievals.recipeId))

export type ListedRetrieval = Awaited<ReturnType<typeof readRetrievalPage>>[number]

/** `where` always begins with the campaigns that the caller may see. */
export const readRetrievalPage = (db: Queryable, { where, keyset, limit }: { where: SQL | undefined, keyset: Keyset, limit: number }) =>
  rows(db).where(and(where, keysetAfter(keyset))).orderBy(...orderOf(keyset)).limit(limit)

export const readNewest = (db: Queryable, where: SQL | undefined, limit: number) =>
  rows(db).where(where).orderBy(desc(retrievals.id)).limit(limit)

export async function readListed(db: Queryable, id: string): Promise<ListedRetrieval | undefined> {
  const [row] = await rows(db).where(eq(retrievals.id, id)).orderBy(asc(retrievals.id)).limit(1)
  return row
}

export const countRetrievals = (db: Queryable, where: SQL | undefined): Promise<number> => db.$count(retrievals, where)

/** The filter as a condition, inside the campaigns given. */
export function filterCondition(campaignIds: string[], filter: RetrievalFilter): SQL | undefined {
  const bits = flagsToBits(filter.flag)
  return and(
    campaignIds.length > 0 ? inArray(retrievals.campaignId, campaignIds) : sql`false`,
    filter.phase.length > 0 ? inArray(retrievals.phase, filter.phase) : undefined,
    bits > 0 ? sql`(${retrievals.flagBits} & ${bits}) = ${bits}` : undefined,
    filter.band ? eq(retrievals.band, filter.band) : undefined,
    filter.verdict === 'none' ? isNull(retrievals.verdict) : filter.verdict ? eq(retrievals.verdict, filter.verdict) : undefined,
    filter.batch ? eq(retrievals.batchId, filter.batch) : undefined,
    filter.from ? gte(retrievals.observedAt, new Date(filter.from)) : undefined,
    filter.to ? lt(retrievals.observedAt, new Date(filter.to)) : undefined,
    filter.q ? or(like(retrievals.name, containing(filter.q)), like(retrievals.note, containing(filter.q))) : undefined,
  )
}
