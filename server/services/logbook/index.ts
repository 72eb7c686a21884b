import type { LogbookQuery, LogbookView } from '#shared/schemas/logbook'
import { pageOf } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { countLogbookEntries, findLogbookEntries } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { visibleCampaignIds } from '../campaigns/access'

type Row = Awaited<ReturnType<typeof findLogbookEntries>>[number]

const logbookView = ({ entry, actorName }: Row): LogbookView => ({
  id: entry.id,
  at: entry.at.toISOString(),
  actor: actorName,
  action: entry.action,
  detail: entry.detail,
})

/** What was done with one thing, oldest first. Of a campaign that the caller is no member of: not found. */
export async function readLogbook(actor: Actor, { object, limit, cursor }: LogbookQuery): Promise<Page<LogbookView>> {
  const [objectKind = '', objectId = ''] = object.split(':')
  const db = database()
  const [first] = await findLogbookEntries(db, { objectKind, objectId, after: null, limit: 1 })
  if (!first || !(await maySee(actor, first))) throw new DomainError('not_found', 'There is no such entry in the logbook.')
  const [rows, total] = await Promise.all([
    findLogbookEntries(db, { objectKind, objectId, after: cursor ?? null, limit: limit + 1 }),
    countLogbookEntries(db, objectKind, objectId),
  ])
  return pageOf(rows, { limit, total, id: row => row.entry.id, view: logbookView })
}

async function maySee(actor: Actor, { entry }: Row): Promise<boolean> {
  if (entry.campaignId === null) return actor.isAdministrator || entry.objectId === actor.userId
  const visible: Iterable<string> = await visibleCampaignIds(actor)
  return new Set(visible).has(entry.campaignId)
}
