import { index, mysqlTable, varchar } from 'drizzle-orm/mysql-core'
import { timestampColumn, trustedJsonColumn, ulidColumn } from '../columns'

/** Who did what when, from what to what. Written in the transaction of the deed. */
export const logbook = mysqlTable('logbook', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn(),
  objectKind: varchar({ length: 32 }).notNull(),
  objectId: ulidColumn().notNull(),
  actorId: ulidColumn(),
  action: varchar({ length: 64 }).notNull(),
  detail: trustedJsonColumn<Record<string, unknown>>().notNull(),
  at: timestampColumn().notNull(),
}, t => [index('logbook_object').on(t.objectKind, t.objectId, t.id), index('logbook_campaign').on(t.campaignId, t.id)])
