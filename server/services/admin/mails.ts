import { mailStates, type MailListQuery, type ManagedMail } from '#shared/schemas/admin'
import { pageOf } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { countMails, dueAgain, findMail, findMails, type ListedMail } from '../../database/outbox/admin-repository'
import type { Actor } from '../accounts/actor'

/** What the outbox holds; without a state, what is not yet sent. */
export async function listMails({ limit, cursor, state }: MailListQuery): Promise<Page<ManagedMail>> {
  const states = state ? [state] : mailStates.filter(one => one !== 'sent')
  const [rows, total] = await Promise.all([findMails(database(), states, { before: cursor ?? null, limit: limit + 1 }), countMails(database(), states)])
  return pageOf(rows, { limit, total, id: row => row.mail.id, view: mailView })
}

/** Sends a mail that waits or was given up, at once. */
export async function resendMail(actor: Actor, id: string): Promise<ManagedMail> {
  await database().transaction(async (tx) => {
    const found = await findMail(tx, id)
    if (!found) throw new DomainError('not_found', 'There is no such mail.')
    if (!await dueAgain(tx, id)) throw new DomainError('already_finished', 'The mail server has taken this mail already.')
    await writeLogbook(tx, { campaignId: null, objectKind: 'mail', objectId: id, actorId: actor.userId, action: 'send-again', detail: { kind: found.mail.kind } })
  })
  return mailView((await findMail(database(), id))!)
}

const mailView = ({ mail, accountEmail }: ListedMail): ManagedMail => ({
  id: mail.id,
  kind: mail.kind,
  to: mail.address ?? accountEmail,
  state: mail.state,
  attempts: mail.attempts,
  lastError: mail.lastError,
  createdAt: mail.createdAt.toISOString(),
  nextAttemptAt: mail.nextAttemptAt.toISOString(),
  sentAt: mail.sentAt?.toISOString() ?? null,
})
