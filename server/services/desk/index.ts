import type { SQL } from 'drizzle-orm'
import type { Desk } from '#shared/types/desk'
import type { RetrievalRow } from '#shared/types/retrieval'
import type { CampaignRole } from '#shared/types/roles'
import { may } from '#shared/utils/permissions'
import { database } from '../../database/client'
import { countRetrievals, readNewest } from '../../database/retrievals/list'
import { findMineToMend } from '../../database/spectra/repository'
import { countLastNight, anyEndedSince, mineEndedSince, mineInPhases, reviewable } from '../../database/retrievals/desk'
import type { Actor } from '../accounts/actor'
import { rolesByCampaign } from '../campaigns/access'
import { spectrumView } from '../spectra/access'
import { rowView } from '../retrievals/view'

const dayMs = 86_400_000

/** What a person finds on their own start page. */
export async function deskOf(actor: Actor): Promise<Desk> {
  const roles = await rolesByCampaign(actor)
  const campaignIds = [...roles.keys()]
  const reviewed = campaignIds.filter(id => may(roles.get(id), 'review'))
  const [running, waitingForMe, needsMending, cameBack, waitingForMyReview, lastNight] = await Promise.all([
    few(mineInPhases(actor.userId, campaignIds, ['QUEUED', 'EXECUTING'])),
    few(mineInPhases(actor.userId, campaignIds, ['PENDING', 'HELD'])),
    toMend(actor, roles),
    cameBackTo(actor.userId, campaignIds, reviewed),
    few(reviewable(actor.userId, reviewed)),
    countLastNight(database(), campaignIds, new Date(Date.now() - dayMs)),
  ])
  return { running, waitingForMe, needsMending, ...cameBack, waitingForMyReview, lastNight }
}

/** Who leads or analyses and has nothing of their own sees what others got. */
async function cameBackTo(userId: string, campaignIds: string[], reviewed: string[]): Promise<Pick<Desk, 'cameBack' | 'cameBackTo'>> {
  const since = new Date(Date.now() - 7 * dayMs)
  const mine = await few(mineEndedSince(userId, campaignIds, since))
  if (mine.total > 0 || reviewed.length === 0) return { cameBack: mine, cameBackTo: 'me' }
  return { cameBack: await few(anyEndedSince(reviewed, since)), cameBackTo: 'campaigns' }
}

async function toMend(actor: Actor, roles: Map<string, CampaignRole>): Promise<Desk['needsMending']> {
  const { items, total } = await findMineToMend(database(), { userId: actor.userId, campaignIds: [...roles.keys()], limit: 10 })
  return { items: items.map(row => spectrumView(actor, { ...row, role: roles.get(row.spectrum.campaignId)! })), total }
}

async function few(where: SQL | undefined): Promise<{ items: RetrievalRow[], total: number }> {
  const [rows, total] = await Promise.all([readNewest(database(), where, 10), countRetrievals(database(), where)])
  return { items: rows.map(rowView), total }
}
