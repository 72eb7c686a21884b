import type { AccountDetail, StandingChange } from '#shared/schemas/admin'
import { DomainError } from '#shared/utils/domain-error'
import { lockAdministrators, revokeAllSessions, updateStanding } from '../../database/accounts/admin-repository'
import { findUser, type UserRow } from '../../database/accounts/repository'
import { database, type Transaction } from '../../database/client'
import { newId } from '../../database/ids'
import { writeLogbook } from '../../database/logbook/repository'
import type { Standing } from '../../mail/standing'
import type { Actor } from '../accounts/actor'
import { lockCampaignsLedAlone } from '../members/last-lead'
import { putMail } from '../outbox/put-mail'
import { readAccount } from './accounts'
import { appoint } from './appoint'

/** Deactivates or reactivates an account, makes it an administrator or takes that back. */
export async function changeStanding(actor: Actor, id: string, change: StandingChange): Promise<AccountDetail> {
  // Read committed: what is read after a lock is what stands then.
  await database().transaction(async (tx) => {
    const administrators = await lockAdministrators(tx)
    const user = await findUser(tx, id)
    if (!user) throw new DomainError('not_found', 'There is no such account.')
    if (user.version !== change.version) throw new DomainError('stale_version', `The account of ${user.name} was changed in the meantime; look at it as it stands now.`, undefined, await readAccount(id, tx))
    const deeds = deedsOf(user, change)
    if (deeds.length === 0) return
    refuseLastAdministrator(administrators, user, deeds)
    if (deeds.includes('deactivated')) await handCampaignsOn(tx, actor, user, change)
    await store(tx, user, deeds)
    for (const deed of deeds) await announce(tx, actor, user, deed)
  }, { isolationLevel: 'read committed' })
  return readAccount(id)
}

function deedsOf(user: UserRow, { active, isAdministrator }: StandingChange): Standing[] {
  const isActive = user.deactivatedAt === null
  return [
    ...(active !== undefined && active !== isActive ? [active ? 'reactivated' as const : 'deactivated' as const] : []),
    ...(isAdministrator !== undefined && isAdministrator !== user.isAdministrator ? [isAdministrator ? 'made-administrator' as const : 'no-administrator' as const] : []),
  ]
}

function refuseLastAdministrator(administrators: { id: string }[], { id }: UserRow, deeds: Standing[]): void {
  const goes = deeds.includes('deactivated') || deeds.includes('no-administrator')
  if (goes && administrators.length === 1 && administrators[0]!.id === id) {
    throw new DomainError('last_administrator', 'The service needs an administrator, and this is the only one. Make another account an administrator first.')
  }
}

/** No campaign is left without a lead: each one that only they lead goes to the successor named for it. */
async function handCampaignsOn(tx: Transaction, actor: Actor, user: UserRow, { successors }: StandingChange): Promise<void> {
  const alone = await lockCampaignsLedAlone(tx, user.id)
  const orphaned = alone.filter(({ slug }) => !successors.some(({ campaign }) => campaign === slug))
  if (orphaned.length > 0) {
    throw new DomainError('last_lead', `${user.name} is the only lead of ${orphaned.map(({ title }) => title).join(', ')}. Name the member who leads each of them from now on, or let ${user.name} hand them on first.`,
      orphaned.map(({ slug, title }) => ({ path: `successors.${slug}`, message: `Who leads ${title} from now on?` })))
  }
  for (const campaign of alone) await appoint(tx, actor, campaign, user, successors.find(({ campaign: slug }) => slug === campaign.slug)!.userId)
}

async function store(tx: Transaction, user: UserRow, deeds: Standing[]): Promise<void> {
  const has = (deed: Standing) => deeds.includes(deed)
  await updateStanding(tx, user, {
    ...(has('deactivated') ? { deactivatedAt: new Date() } : has('reactivated') ? { deactivatedAt: null } : {}),
    ...(has('made-administrator') ? { isAdministrator: true } : has('no-administrator') ? { isAdministrator: false } : {}),
  })
  if (has('deactivated')) await revokeAllSessions(tx, user.id)
}

/** To the address itself: a deactivated account gets no mail otherwise. */
async function announce(tx: Transaction, actor: Actor, user: UserRow, standing: Standing): Promise<void> {
  await writeLogbook(tx, { campaignId: null, objectKind: 'account', objectId: user.id, actorId: actor.userId, action: standing, detail: { name: user.name } })
  if (user.id !== actor.userId) await putMail(tx, { subjectKey: `standing:${newId()}`, kind: 'standing', address: user.email, payload: { standing, by: actor.name } })
}
