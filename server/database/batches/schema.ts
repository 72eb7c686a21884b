import { index, int, mysqlTable, varchar } from 'drizzle-orm/mysql-core'
import { users } from '../accounts/schema'
import { campaigns } from '../campaigns/schema'
import { timestampColumn, ulidColumn } from '../columns'

/** One submission, of one retrieval or of a thousand. */
export const batches = mysqlTable('batches', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id),
  ownerId: ulidColumn().notNull().references(() => users.id),
  total: int().notNull(),
  note: varchar({ length: 2000 }).notNull().default(''),
  createdAt: timestampColumn().notNull(),
  /** Set with the digest mail that says the batch is done. */
  digestAt: timestampColumn(),
}, t => [index('batches_owner').on(t.ownerId, t.createdAt)])
