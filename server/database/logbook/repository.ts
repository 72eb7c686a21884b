import { and, asc, eq, gt } from 'drizzle-orm'
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

interface ObjectQuery { objectKind: string, objectId: string, after: string | null, limit: number }

export const findLogbookEntries = (db: Queryable, { objectKind, objectId, after, limit }: ObjectQuery) =>
  db.select({ entry: logbook, actorName: users.name })
    .from(logbook)
    .leftJoin(users, eq(users.id, logbook.actorId))
    .where(and(eq(logbook.objectKind, objectKind), eq(logbook.objectId, objectId), after ? gt(logbook.id, after) : undefined))
    .orderBy(asc(logbook.id))
    .limit(limit)

export const countLogbookEntries = (db: Queryable, objectKind: string, objectId: string) =>
  db.$count(logbook, and(eq(logbook.objectKind, objectKind), eq(logbook.objectId, objectId)))
