import { boolean, index, int, mysqlEnum, mysqlTable, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { mailPreferences, tokenScopes } from '../../../shared/types/roles'
import { timestampColumn, ulidColumn } from '../columns'

export const users = mysqlTable('users', {
  id: ulidColumn().primaryKey(),
  email: varchar({ length: 254 }).notNull(),
  name: varchar({ length: 120 }).notNull(),
  passwordHash: varchar({ length: 255 }),
  isAdministrator: boolean().notNull().default(false),
  mailPreference: mysqlEnum(mailPreferences).notNull().default('digest'),
  deactivatedAt: timestampColumn(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [uniqueIndex('users_email').on(t.email)])

/** A sign-in that lives: a copied cookie dies with its row. */
export const sessions = mysqlTable('sessions', {
  id: ulidColumn().primaryKey(),
  userId: ulidColumn().notNull().references(() => users.id, { onDelete: 'cascade' }),
  userAgent: varchar({ length: 300 }).notNull().default(''),
  createdAt: timestampColumn().notNull(),
  lastSeenAt: timestampColumn().notNull(),
  expiresAt: timestampColumn().notNull(),
  revokedAt: timestampColumn(),
}, t => [index('sessions_user').on(t.userId)])

export const apiTokens = mysqlTable('api_tokens', {
  id: ulidColumn().primaryKey(),
  userId: ulidColumn().notNull().references(() => users.id, { onDelete: 'cascade' }),
  name: varchar({ length: 120 }).notNull(),
  /** SHA-256 of the token, hex; the token itself is shown once. */
  tokenHash: varchar({ length: 64 }).notNull(),
  scope: mysqlEnum(tokenScopes).notNull(),
  createdAt: timestampColumn().notNull(),
  expiresAt: timestampColumn(),
  lastUsedAt: timestampColumn(),
  revokedAt: timestampColumn(),
}, t => [uniqueIndex('api_tokens_hash').on(t.tokenHash), index('api_tokens_user').on(t.userId)])

/** One-time links (first administrator now; invitations and resets later), stored hashed. */
export const oneTimeLinks = mysqlTable('one_time_links', {
  id: ulidColumn().primaryKey(),
  purpose: mysqlEnum(['set-up']).notNull(),
  tokenHash: varchar({ length: 64 }).notNull(),
  createdAt: timestampColumn().notNull(),
  expiresAt: timestampColumn().notNull(),
  usedAt: timestampColumn(),
}, t => [uniqueIndex('one_time_links_hash').on(t.tokenHash)])
