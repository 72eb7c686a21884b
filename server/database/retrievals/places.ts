import { and, eq } from 'drizzle-orm'
import { instruments, stations } from '../campaigns/schema'
import type { Queryable } from '../client'

export async function findStationId(db: Queryable, campaignId: string, slug: string): Promise<string | null> {
  const [row] = await db.select({ id: stations.id }).from(stations).where(and(eq(stations.campaignId, campaignId), eq(stations.slug, slug)))
  return row?.id ?? null
}

export async function findInstrumentId(db: Queryable, campaignId: string, slug: string): Promise<string | null> {
  const [row] = await db.select({ id: instruments.id }).from(instruments).where(and(eq(instruments.campaignId, campaignId), eq(instruments.slug, slug)))
  return row?.id ?? null
}
