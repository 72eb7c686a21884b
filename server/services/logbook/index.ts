import type { LogbookQuery, LogbookView } from '#shared/schemas/logbook'
import { pageOf } from '#shared/schemas/paging'
import type { Page } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { findObjectNames, findSiblingVersions, type ObjectName } from '../../database/logbook/names'
import { countLogbookEntries, findLogbookEntries, type LogbookScope } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { campaignByIdFor, campaignFor } from '../campaigns/access'

type Row = Awaited<ReturnType<typeof findLogbookEntries>>[number]

/** What was done with one thing, or in a whole campaign. What the caller may not see is not found. */
export async function readLogbook(actor: Actor, query: LogbookQuery): Promise<Page<LogbookView>> {
  const { scope, member } = query.campaign === undefined ? await objectScope(actor, query.object ?? '') : await campaignScope(actor, query.campaign, query.kind)
  const newestFirst = (query.sort ?? (query.campaign === undefined ? 'at' : '-at')) === '-at'
  const db = database()
  const [rows, total] = await Promise.all([
    findLogbookEntries(db, scope, { after: query.cursor ?? null, limit: query.limit + 1, newestFirst }),
    countLogbookEntries(db, scope),
  ])
  const names = await findObjectNames(db, rows.map(({ entry }) => ({ kind: entry.objectKind, id: entry.objectId })))
  return pageOf(rows, { limit: query.limit, total, id: row => row.entry.id, view: row => logbookView(row, names, member) })
}

function logbookView({ entry, actorName }: Row, names: Map<string, ObjectName>, member: boolean): LogbookView {
  const known = names.get(`${entry.objectKind}:${entry.objectId}`)
  return {
    id: entry.id,
    at: entry.at.toISOString(),
    actor: actorName,
    action: entry.action,
    detail: member ? entry.detail : withoutAddress(entry.detail),
    object: { kind: entry.objectKind, id: entry.objectId, name: known?.name ?? null, address: known?.address ?? null },
  }
}

/** E-mail addresses are for those who belong to the campaign. */
const withoutAddress = ({ email: _, ...detail }: Record<string, unknown>) => detail

interface Told { scope: LogbookScope, member: boolean }

async function campaignScope(actor: Actor, slug: string, kind: string | undefined): Promise<Told> {
  const { campaign, member } = await campaignFor(actor, slug, 'see')
  return { scope: { campaignId: campaign.id, objectKind: kind ?? null }, member }
}

const nothing = () => new DomainError('not_found', 'There is no such entry in the logbook.')
const hidden = (error: unknown) => { throw error instanceof DomainError ? nothing() : error }

async function objectScope(actor: Actor, object: string): Promise<Told> {
  const [objectKind = '', objectId = ''] = object.split(':')
  const objectIds = objectKind === 'recipe' ? await findSiblingVersions(database(), objectId) : [objectId]
  const scope = { objectKind, objectIds }
  const [first] = await findLogbookEntries(database(), scope, { after: null, limit: 1, newestFirst: false })
  if (!first) throw nothing()
  const { campaignId, objectId: id } = first.entry
  if (campaignId !== null) return { scope, member: (await campaignByIdFor(actor, campaignId, 'see').catch(hidden)).member }
  if (!actor.isAdministrator && id !== actor.userId) throw nothing()
  return { scope, member: true }
}
