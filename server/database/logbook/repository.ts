import { and, asc, desc, eq, gt, inArray, lt, type SQL } from 'drizzle-orm'
import { users } from '../accounts/schema'
import type { Queryable } from '../client'
import { newId } from '../ids'
import { logbook } from './schema'

export interface LogbookDeed {
  campaignId: string | null
  objectKind: string
  objectId: string
  actorId: string | null
  action: string
  detail?: Record<string, unknown>
}

/** Call it in the transaction of the deed, so that neither stands without the other. */
export async function writeLogbook(db: Queryable, deed: LogbookDeed): Promise<void> {
  await writeLogbookEntries(db, [deed])
}

export async function writeLogbookEntries(db: Queryable, deeds: LogbookDeed[]): Promise<void> {
  if (deeds.length === 0) return
  const at = new Date()
  await db.insert(logbook).values(deeds.map(deed => ({ ...deed, id: newId(), detail: deed.detail ?? {}, at })))
}

/** What a page of the logbook is about: some things of one kind, or all of a campaign. */
export type LogbookScope = { objectKind: string, objectIds: string[] } | { campaignId: string, objectKind: string | null }
interface Window { after: string | null, limit: number, newestFirst: boolean }

const within = (scope: LogbookScope): SQL | undefined => 'campaignId' in scope
  ? and(eq(logbook.campaignId, scope.campaignId), scope.objectKind === null ? undefined : eq(logbook.objectKind, scope.objectKind))
  : and(eq(logbook.objectKind, scope.objectKind), inArray(logbook.objectId, scope.objectIds))

export const findLogbookEntries = (db: Queryable, scope: LogbookScope, { after, limit, newestFirst }: Window) =>
  db.select({ entry: logbook, actorName: users.name })
    .from(logbook)
    .leftJoin(users, eq(users.id, logbook.actorId))
    .where(and(within(scope), after ? (newestFirst ? lt : gt)(logbook.id, after) : undefined))
    .orderBy((newestFirst ? desc : asc)(logbook.id))
    .limit(limit)

export const countLogbookEntries = (db: Queryable, scope: LogbookScope) => db.$count(logbook, within(scope))
