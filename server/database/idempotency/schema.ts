import { int, mysqlTable, primaryKey, varchar } from 'drizzle-orm/mysql-core'
import { users } from '../accounts/schema'
import { timestampColumn, trustedJsonColumn, ulidColumn } from '../columns'

/** Answers already given, per account and key, kept 24 h. */
export const idempotencyKeys = mysqlTable('idempotency_keys', {
  userId: ulidColumn().notNull().references(() => users.id, { onDelete: 'cascade' }),
  key: varchar({ length: 200 }).notNull(),
  bodyHash: varchar({ length: 64 }).notNull(),
  status: int().notNull(),
  answer: trustedJsonColumn<unknown>().notNull(),
  createdAt: timestampColumn().notNull(),
}, t => [primaryKey({ columns: [t.userId, t.key] })])
