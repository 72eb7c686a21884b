import { and, count, eq, gte, inArray, isNull, ne, or, sql, type SQL } from 'drizzle-orm'
import { finalPhases, type Phase } from '../../../shared/types/phases'
import { campaigns, stations } from '../campaigns/schema'
import type { Queryable } from '../client'
import { retrievals } from './schema'

const within = (campaignIds: string[]): SQL | undefined => campaignIds.length > 0 ? inArray(retrievals.campaignId, campaignIds) : sql`false`

export const mineInPhases = (userId: string, campaignIds: string[], phases: Phase[]): SQL | undefined =>
  and(within(campaignIds), eq(retrievals.ownerId, userId), inArray(retrievals.phase, phases))

const ended = (since: Date): SQL | undefined => and(inArray(retrievals.phase, [...finalPhases]), gte(retrievals.finishedAt, since))

export const mineEndedSince = (userId: string, campaignIds: string[], since: Date): SQL | undefined =>
  and(within(campaignIds), eq(retrievals.ownerId, userId), ended(since))

export const anyEndedSince = (campaignIds: string[], since: Date): SQL | undefined => and(within(campaignIds), ended(since))

/** Completed, without a verdict, and not one's own unless the campaign allows that. */
export const reviewable = (userId: string, campaignIds: string[]): SQL | undefined => and(
  within(campaignIds), eq(retrievals.phase, 'COMPLETED'), isNull(retrievals.verdict),
  or(ne(retrievals.ownerId, userId), sql`exists (select 1 from ${campaigns} c where c.id = ${retrievals.campaignId} and c.self_review)`),
)

/** What was observed since then, by station. */
export async function countLastNight(db: Queryable, campaignIds: string[], since: Date) {
  const rows = await db.select({ station: stations.name, campaign: campaigns.slug, phase: retrievals.phase, count: count() }).from(retrievals)
    .innerJoin(stations, eq(stations.id, retrievals.stationId))
    .innerJoin(campaigns, eq(campaigns.id, retrievals.campaignId))
    .where(and(within(campaignIds), gte(retrievals.observedAt, since)))
    .groupBy(stations.id, stations.name, campaigns.slug, retrievals.phase)
  const nights = new Map<string, { station: string, campaign: string, total: number, byPhase: Partial<Record<Phase, number>> }>()
  for (const { station, campaign, phase, count: n } of rows) {
    const night = nights.get(`${campaign}/${station}`) ?? { station, campaign, total: 0, byPhase: {} }
    night.total += n
    night.byPhase[phase] = n
    nights.set(`${campaign}/${station}`, night)
  }
  return [...nights.values()]
}
