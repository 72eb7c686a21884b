import { DomainError } from '#shared/utils/domain-error'
import { countOtherLeads, findCampaignsLedBy, lockCampaigns } from '../../database/campaigns/repository-members'
import type { Queryable, Transaction } from '../../database/client'

/** Refuses what would leave the campaign without a lead who can act. The campaign must be locked before. */
export async function refuseLastLead(tx: Transaction, campaignId: string, userId: string): Promise<void> {
  if (await countOtherLeads(tx, campaignId, userId) === 0) {
    throw new DomainError('last_lead', 'A campaign needs a lead, and this is its only one. Hand it on first: give another member the role lead, or invite somebody as lead and wait until they have joined.')
  }
}

/** Campaigns that nobody else leads. */
export async function campaignsLedAlone(db: Queryable, userId: string): Promise<{ id: string, slug: string, title: string }[]> {
  const led = await findCampaignsLedBy(db, userId)
  const others = await Promise.all(led.map(({ id }) => countOtherLeads(db, id, userId)))
  return led.filter((_, index) => others[index] === 0)
}

/** The same while their members are held still, for an account that is about to go. */
export async function lockCampaignsLedAlone(tx: Transaction, userId: string): Promise<{ id: string, slug: string, title: string }[]> {
  await lockCampaigns(tx, (await findCampaignsLedBy(tx, userId)).map(({ id }) => id))
  return campaignsLedAlone(tx, userId)
}
