import type { AccountDetail, AccountListQuery, ManagedAccount } from '#shared/schemas/admin'
import { pageOf } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { countAccounts, findAccount, findAccounts, type SeenAccount } from '../../database/accounts/admin-repository'
import { findMembers } from '../../database/campaigns/repository-members'
import { database, type Queryable } from '../../database/client'
import { campaignsLedAlone } from '../members/last-lead'

const mostSuccessors = 500

export async function listAccounts({ limit, cursor, ...filter }: AccountListQuery): Promise<Page<ManagedAccount>> {
  const [rows, total] = await Promise.all([
    findAccounts(database(), filter, { before: cursor ?? null, limit: limit + 1 }),
    countAccounts(database(), filter),
  ])
  return pageOf(rows, { limit, total, id: row => row.user.id, view: accountView })
}

/** With the campaigns that would lose their only lead. */
export async function readAccount(id: string, db: Queryable = database()): Promise<AccountDetail> {
  const found = await findAccount(db, id)
  if (!found) throw new DomainError('not_found', 'There is no such account.')
  const led = await campaignsLedAlone(db, id)
  const members = await Promise.all(led.map(campaign => findMembers(db, campaign.id, { after: null, limit: mostSuccessors })))
  return {
    ...accountView(found),
    leadsAlone: led.map(({ slug, title }, index) => ({
      campaign: slug,
      title,
      members: members[index]!.filter(member => member.userId !== id && !member.deactivatedAt).map(({ userId, name, email, role }) => ({ userId, name, email, role })),
    })),
  }
}

function accountView({ user, seenAt, tokenUsedAt, campaignCount }: SeenAccount): ManagedAccount {
  const seen = [seenAt, tokenUsedAt].flatMap(at => at ? [at.getTime()] : [])
  return {
    id: user.id,
    email: user.email,
    name: user.name,
    isAdministrator: user.isAdministrator,
    active: user.deactivatedAt === null,
    deactivatedAt: user.deactivatedAt?.toISOString() ?? null,
    createdAt: user.createdAt.toISOString(),
    lastSeenAt: seen.length > 0 ? new Date(Math.max(...seen)).toISOString() : null,
    campaigns: campaignCount ?? 0,
    version: user.version,
  }
}
