import { boolean, index, int, mysqlEnum, mysqlTable, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { campaignRoles } from '../../../shared/types/roles'
import { users } from '../accounts/schema'
import { campaigns } from '../campaigns/schema'
import { timestampColumn, ulidColumn } from '../columns'

/** An address that was asked to join a campaign, or the service. */
export const invitations = mysqlTable('invitations', {
  id: ulidColumn().primaryKey(),
  /** Null: to the service itself. */
  campaignId: ulidColumn().references(() => campaigns.id, { onDelete: 'cascade' }),
  email: varchar({ length: 254 }).notNull(),
  /** In the campaign; null without one. */
  role: mysqlEnum(campaignRoles),
  asAdministrator: boolean().notNull().default(false),
  /** SHA-256 of the secret in the link, hex. */
  tokenHash: varchar({ length: 64 }).notNull(),
  /** Each sending has a secret of its own; the one before opens nothing any more. */
  round: int().notNull().default(1),
  /** Who is invited to what, until it is accepted or withdrawn: nobody is invited twice at once. */
  openKey: varchar({ length: 300 }),
  invitedBy: ulidColumn().notNull().references(() => users.id),
  createdAt: timestampColumn().notNull(),
  sentAt: timestampColumn().notNull(),
  expiresAt: timestampColumn().notNull(),
  acceptedAt: timestampColumn(),
  acceptedBy: ulidColumn().references(() => users.id),
  withdrawnAt: timestampColumn(),
}, t => [uniqueIndex('invitations_token').on(t.tokenHash), uniqueIndex('invitations_open').on(t.openKey), index('invitations_campaign').on(t.campaignId, t.id)])
