import { and, asc, eq, gt } from 'drizzle-orm'
import type { Queryable } from '../client'
import { instruments, stations } from './schema'

export type StationRow = typeof stations.$inferSelect
export type InstrumentRow = typeof instruments.$inferSelect
interface Window { after: string | null, limit: number }

export const findStations = (db: Queryable, campaignId: string, { after, limit }: Window): Promise<StationRow[]> =>
  db.select().from(stations)
    .where(and(eq(stations.campaignId, campaignId), after ? gt(stations.id, after) : undefined))
    .orderBy(asc(stations.id))
    .limit(limit)

export const countStations = (db: Queryable, campaignId: string) => db.$count(stations, eq(stations.campaignId, campaignId))

export async function findStationBySlug(db: Queryable, campaignId: string, slug: string): Promise<StationRow | undefined> {
  const [row] = await db.select().from(stations).where(and(eq(stations.campaignId, campaignId), eq(stations.slug, slug)))
  return row
}

export async function insertStation(db: Queryable, row: typeof stations.$inferInsert): Promise<void> {
  await db.insert(stations).values(row)
}

export const findInstruments = (db: Queryable, campaignId: string, { after, limit }: Window) =>
  db.select({ instrument: instruments, station: stations.slug })
    .from(instruments)
    .leftJoin(stations, eq(stations.id, instruments.stationId))
    .where(and(eq(instruments.campaignId, campaignId), after ? gt(instruments.id, after) : undefined))
    .orderBy(asc(instruments.id))
    .limit(limit)

export const countInstruments = (db: Queryable, campaignId: string) => db.$count(instruments, eq(instruments.campaignId, campaignId))

export async function findInstrumentBySlug(db: Queryable, campaignId: string, slug: string): Promise<InstrumentRow | undefined> {
  const [row] = await db.select().from(instruments).where(and(eq(instruments.campaignId, campaignId), eq(instruments.slug, slug)))
  return row
}

export async function insertInstrument(db: Queryable, row: typeof instruments.$inferInsert): Promise<void> {
  await db.insert(instruments).values(row)
}
