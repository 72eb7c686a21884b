import { and, count, desc, eq, isNotNull, sql, type SQL } from 'drizzle-orm'
import type { Queryable } from '../client'
import { retrievals } from './schema'

/** How far solar time at the station is ahead of UTC. */
interface AtStation { stationId: string, solarOffsetMs: number }

/** The evening's date: solar time less twelve hours. */
const nightAt = ({ solarOffsetMs }: AtStation): SQL<string> =>
  sql<string>`date_format(${retrievals.observedAt} + interval ${solarOffsetMs / 1000 - 43_200} second, '%Y-%m-%d')`

const observedAt = ({ stationId }: AtStation) => and(eq(retrievals.stationId, stationId), isNotNull(retrievals.observedAt))

const inPhase = (phase: string) => sql<number>`sum(${retrievals.phase} = ${phase})`.mapWith(Number)

/** What came in night by night, newest first. */
export const findNights = (db: Queryable, at: AtStation, { before, limit }: { before: string | null, limit: number }) =>
  db.select({ night: nightAt(at).as('night'), total: count(), completed: inPhase('COMPLETED'), failed: inPhase('ERROR') })
    .from(retrievals)
    .where(and(observedAt(at), before ? sql`${nightAt(at)} < ${before}` : undefined))
    .groupBy(sql`night`)
    .orderBy(desc(sql`night`))
    .limit(limit)

export async function countNights(db: Queryable, at: AtStation): Promise<number> {
  const [row] = await db.select({ count: sql<number>`count(distinct ${nightAt(at)})`.mapWith(Number) }).from(retrievals).where(observedAt(at))
  return row?.count ?? 0
}
