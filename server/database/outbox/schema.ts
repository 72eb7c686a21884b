import { index, int, mysqlEnum, mysqlTable, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { users } from '../accounts/schema'
import { timestampColumn, trustedJsonColumn, ulidColumn } from '../columns'

export const mailKinds = ['result', 'failure', 'digest', 'invitation', 'membership', 'standing'] as const

/** Mail waits here from the transaction of the result it speaks of until the mail server takes it. */
export const outbox = mysqlTable('outbox', {
  id: ulidColumn().primaryKey(),
  /** What the mail is about; unique, so that a thing is announced once. */
  subjectKey: varchar({ length: 120 }).notNull(),
  /** To whom; null for an address that need not have an account. */
  userId: ulidColumn().references(() => users.id),
  address: varchar({ length: 254 }),
  kind: mysqlEnum(mailKinds).notNull(),
  payload: trustedJsonColumn<Record<string, string | number | null>>().notNull(),
  /** Stable: the same mail sent twice carries the same Message-ID. */
  messageId: varchar({ length: 200 }).notNull(),
  state: mysqlEnum(['waiting', 'sent', 'failed']).notNull().default('waiting'),
  attempts: int().notNull().default(0),
  lastError: text(),
  nextAttemptAt: timestampColumn().notNull(),
  createdAt: timestampColumn().notNull(),
  sentAt: timestampColumn(),
}, t => [uniqueIndex('outbox_subject').on(t.subjectKey), index('outbox_due').on(t.state, t.nextAttemptAt)])
