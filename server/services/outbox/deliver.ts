import { findUser } from '../../database/accounts/repository'
import { database } from '../../database/client'
import { lockDueMail, updateMail, type OutboxRecord } from '../../database/outbox/repository'
import { logger } from '../../logger'
import { sendMail, type Mail } from '../../mail/transport'
import { writeMail } from './write-mail'

/** After these the mail is given up; the result itself is on its page. */
const maxAttempts = 30
const longestWaitMs = 3600_000

export const waitAfter = (attempts: number): number => Math.min(1000 * 2 ** Math.min(attempts, 20), longestWaitMs)

/** Sends every mail that is due. @returns how many were taken by the mail server */
export async function deliverMail(signal?: AbortSignal): Promise<number> {
  let sent = 0
  for (;;) {
    if (signal?.aborted) return sent
    const outcome = await deliverOne()
    if (outcome === 'none') return sent
    if (outcome === 'sent') sent++
  }
}

/**
 * Holds the row's lock while the mail server is asked: if we die in between, the row waits again and goes out under the
 * same Message-ID. Read committed, so that the lock keeps nobody from adding mails.
 */
const deliverOne = (): Promise<'none' | 'sent' | 'later'> => database().transaction(async (tx) => {
  const row = await lockDueMail(tx, new Date())
  if (!row) return 'none'
  const attempts = row.attempts + 1
  try {
    const mail = await mailOf(row)
    if (mail) await sendMail(mail)
    await updateMail(tx, row.id, { state: 'sent', attempts, sentAt: new Date(), lastError: mail ? null : 'not sent: what it speaks of is gone' })
    return 'sent'
  }
  catch (error) {
    const lastError = (error as Error).message.slice(0, 1000)
    if (attempts === 1) logger.warn({ mail: row.messageId, reason: lastError }, 'mail not taken; it is tried again')
    await updateMail(tx, row.id, { state: attempts >= maxAttempts ? 'failed' : 'waiting', attempts, lastError, nextAttemptAt: new Date(Date.now() + waitAfter(attempts)) })
    return 'later'
  }
}, { isolationLevel: 'read committed' })

async function mailOf(row: OutboxRecord): Promise<Mail | null> {
  const to = await recipientOf(row)
  const content = to && await writeMail(row)
  return to && content ? { ...content, to, messageId: row.messageId } : null
}

/** An address of its own, or the account's as it is now; null when the account is deactivated. */
async function recipientOf({ userId, address }: OutboxRecord): Promise<Mail['to'] | null> {
  if (address !== null) return { name: '', address }
  const user = userId === null ? undefined : await findUser(database(), userId)
  return user && !user.deactivatedAt ? { name: user.name, address: user.email } : null
}
