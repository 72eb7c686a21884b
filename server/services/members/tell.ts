import type { Transaction } from '../../database/client'
import { newId } from '../../database/ids'
import type { MembershipChange } from '../../mail/membership'
import { putMail } from '../outbox/put-mail'

/** Tells a person by mail what became of their place in a campaign. */
export const tellMember = (tx: Transaction, campaign: { slug: string, title: string }, userId: string, change: MembershipChange & { by: string }): Promise<void> =>
  putMail(tx, { subjectKey: `membership:${newId()}`, kind: 'membership', userId, payload: { ...change, campaign: campaign.title, slug: campaign.slug } })
