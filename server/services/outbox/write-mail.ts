import { database } from '../../database/client'
import { findBatch, readBatchRows } from '../../database/batches/repository'
import type { OutboxRecord } from '../../database/outbox/repository'
import { readListed } from '../../database/retrievals/list'
import { findResult } from '../../database/retrievals/read'
import { config } from '../../config'
import { digestMail } from '../../mail/digest'
import { membershipMail, type MembershipMailFacts } from '../../mail/membership'
import { resultMail } from '../../mail/result'
import { standingMail, type Standing } from '../../mail/standing'
import type { MailContent } from '../../mail/transport'
import { writeInvitation } from '../invitations/send'

/** The words of a mail, written when it is sent; null when what it speaks of is gone. */
export async function writeMail({ kind, payload }: Pick<OutboxRecord, 'kind' | 'payload'>): Promise<MailContent | null> {
  if (kind === 'digest') return writeDigest(String(payload.batchId))
  if (kind === 'invitation') return writeInvitation(String(payload.invitationId), Number(payload.round))
  if (kind === 'membership') return membershipMail({ ...payload, link: `${config().origin}/campaigns/${payload.slug}` } as MembershipMailFacts)
  if (kind === 'standing') return standingMail({ standing: payload.standing as Standing, by: String(payload.by), origin: config().origin })
  const [id, revision] = [String(payload.retrievalId), Number(payload.revision)]
  return payload.abortedBy ? writeAborted(id, revision, String(payload.abortedBy)) : writeResult(id, revision)
}

const links = (id: string) => ({ link: `${config().origin}/retrievals/${id}`, accountLink: `${config().origin}/account` })

/** Written from the abort itself: the worker may still be on its way to it. */
async function writeAborted(id: string, revision: number, by: string): Promise<MailContent | null> {
  const row = await readListed(database(), id)
  return row
    ? resultMail({ name: row.name, campaign: row.campaignTitle, observedAt: row.observedAt, revision, phase: 'ABORTED', reason: `Aborted by ${by}.`, result: null, ...links(id) })
    : null
}

async function writeResult(id: string, revision: number): Promise<MailContent | null> {
  const [row, stored] = await Promise.all([readListed(database(), id), findResult(database(), id, revision)])
  if (!row || !stored) return null
  return resultMail({
    name: row.name, campaign: row.campaignTitle, observedAt: row.observedAt, revision, phase: stored.phase, reason: stored.reason,
    result: stored.result, ...links(id),
  })
}

async function writeDigest(batchId: string): Promise<MailContent | null> {
  const [batch, rows] = await Promise.all([findBatch(database(), batchId), readBatchRows(database(), batchId)])
  if (!batch || rows.length === 0) return null
  const first = await readListed(database(), rows[0]!.id)
  return digestMail({ campaign: first?.campaignTitle ?? '', note: batch.note, rows, link: `${config().origin}/batches/${batchId}`, accountLink: `${config().origin}/account`, origin: config().origin })
}
