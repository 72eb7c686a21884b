import { boolean, date, double, index, int, mysqlEnum, mysqlTable, primaryKey, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { settingsSchema } from '../../../shared/schemas/settings'
import { observables } from '../../../shared/engine/types'
import { campaignKinds, visibilities } from '../../../shared/types/campaign'
import { campaignRoles } from '../../../shared/types/roles'
import { axisMedia, axisUnits, valueKinds } from '../../../shared/types/spectrum'
import { users } from '../accounts/schema'
import { jsonColumn, timestampColumn, ulidColumn } from '../columns'

export const campaigns = mysqlTable('campaigns', {
  id: ulidColumn().primaryKey(),
  slug: varchar({ length: 64 }).notNull(),
  title: varchar({ length: 200 }).notNull(),
  kind: mysqlEnum(campaignKinds).notNull().default('other'),
  /** First and last day of observations, both inclusive. */
  startsOn: date({ mode: 'string' }),
  endsOn: date({ mode: 'string' }),
  description: text().notNull(),
  visibility: mysqlEnum(visibilities).notNull().default('members'),
  /** May an analyst review a submission of their own? */
  selfReview: boolean().notNull().default(false),
  archivedAt: timestampColumn(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [uniqueIndex('campaigns_slug').on(t.slug), index('campaigns_visibility').on(t.visibility)])

/** Addresses that a campaign had before: they lead to it for good, and no other campaign can take them. */
export const formerCampaignSlugs = mysqlTable('former_campaign_slugs', {
  slug: varchar({ length: 64 }).primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id, { onDelete: 'cascade' }),
  createdAt: timestampColumn().notNull(),
})

export const memberships = mysqlTable('memberships', {
  campaignId: ulidColumn().notNull().references(() => campaigns.id, { onDelete: 'cascade' }),
  userId: ulidColumn().notNull().references(() => users.id, { onDelete: 'cascade' }),
  role: mysqlEnum(campaignRoles).notNull(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [primaryKey({ columns: [t.campaignId, t.userId] }), index('memberships_user').on(t.userId)])

export const stations = mysqlTable('stations', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id, { onDelete: 'cascade' }),
  slug: varchar({ length: 64 }).notNull(),
  name: varchar({ length: 120 }).notNull(),
  /** Degrees north and east, metres; null for a source in space. */
  latitude: double(),
  longitude: double(),
  altitude: double(),
  archivedAt: timestampColumn(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [uniqueIndex('stations_slug').on(t.campaignId, t.slug)])

export const instruments = mysqlTable('instruments', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id, { onDelete: 'cascade' }),
  stationId: ulidColumn().references(() => stations.id),
  slug: varchar({ length: 64 }).notNull(),
  name: varchar({ length: 120 }).notNull(),
  axisUnit: mysqlEnum(axisUnits),
  medium: mysqlEnum(axisMedia),
  valueKind: mysqlEnum(valueKinds),
  defaultObservable: mysqlEnum(observables),
  /** nm; or the resolving power: one of the two. */
  fwhm: double(),
  resolvingPower: double(),
  notes: text().notNull(),
  archivedAt: timestampColumn(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [uniqueIndex('instruments_slug').on(t.campaignId, t.slug)])

/** A recipe is never changed: a change makes the next version. All versions of a slug are archived together. */
export const recipes = mysqlTable('recipes', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id, { onDelete: 'cascade' }),
  slug: varchar({ length: 64 }).notNull(),
  version: int().notNull(),
  name: varchar({ length: 120 }).notNull(),
  settings: jsonColumn(settingsSchema).notNull(),
  createdBy: ulidColumn().notNull().references(() => users.id),
  createdAt: timestampColumn().notNull(),
  archivedAt: timestampColumn(),
}, t => [uniqueIndex('recipes_version').on(t.campaignId, t.slug, t.version)])
