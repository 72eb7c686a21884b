import { and, asc, eq, gt, inArray, isNotNull, sql } from 'drizzle-orm'
import type { Queryable } from '../client'
import { instruments, stations } from './schema'

export type StationRow = typeof stations.$inferSelect
export type InstrumentRow = typeof instruments.$inferSelect
interface Window { after: string | null, limit: number }
interface Change<Row> { id: string, version: number, change: Partial<Omit<Row, 'id' | 'campaignId' | 'version'>> }

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

export async function findStation(db: Queryable, id: string): Promise<StationRow | undefined> {
  const [row] = await db.select().from(stations).where(eq(stations.id, id))
  return row
}

export async function insertStation(db: Queryable, row: typeof stations.$inferInsert): Promise<void> {
  await db.insert(stations).values(row)
}

/** False when the row is no longer at that version. */
export async function updateStation(db: Queryable, { id, version, change }: Change<StationRow>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(stations).set({ ...change, version: sql`${stations.version} + 1` })
    .where(and(eq(stations.id, id), eq(stations.version, version)))
  return affectedRows === 1
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

export async function findInstrument(db: Queryable, id: string): Promise<InstrumentRow | undefined> {
  const [row] = await db.select().from(instruments).where(eq(instruments.id, id))
  return row
}

export async function insertInstrument(db: Queryable, row: typeof instruments.$inferInsert): Promise<void> {
  await db.insert(instruments).values(row)
}

/** False when the row is no longer at that version. */
export async function updateInstrument(db: Queryable, { id, version, change }: Change<InstrumentRow>): Promise<boolean> {
  const [{ affectedRows }] = await db.update(instruments).set({ ...change, version: sql`${instruments.version} + 1` })
    .where(and(eq(instruments.id, id), eq(instruments.version, version)))
  return affectedRows === 1
}

/** Those of the ids, of stations or instruments, that are archived. */
export async function findArchivedPlaces(db: Queryable, ids: string[]): Promise<{ noun: 'station' | 'instrument', id: string, name: string }[]> {
  if (ids.length === 0) return []
  const [archivedStations, archivedInstruments] = await Promise.all([
    db.select({ id: stations.id, name: stations.name }).from(stations).where(and(inArray(stations.id, ids), isNotNull(stations.archivedAt))),
    db.select({ id: instruments.id, name: instruments.name }).from(instruments).where(and(inArray(instruments.id, ids), isNotNull(instruments.archivedAt))),
  ])
  return [...archivedStations.map(row => ({ noun: 'station' as const, ...row })), ...archivedInstruments.map(row => ({ noun: 'instrument' as const, ...row }))]
}
