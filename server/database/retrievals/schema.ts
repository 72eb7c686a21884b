import { bigint, boolean, double, index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { lineTableSchema } from '../../../shared/schemas/line-table'
import { settingsSchema } from '../../../shared/schemas/settings'
import type { RetrievalResult } from '../../../shared/engine/types'
import { phases } from '../../../shared/types/phases'
import type { Provenance } from '../../../shared/types/retrieval'
import { users } from '../accounts/schema'
import { batches } from '../batches/schema'
import { campaigns, instruments, recipes, stations } from '../campaigns/schema'
import { jsonColumn, timestampColumn, trustedJsonColumn, ulidColumn } from '../columns'
import { spectra } from '../spectra/schema'

/**
 * One spectrum (or line table) under one recipe. The row carries its current revision: settings, phase, and, once
 * COMPLETED, the columns that lists sort and filter by. Finished revisions stay in retrieval_results.
 */
export const retrievals = mysqlTable('retrievals', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id),
  ownerId: ulidColumn().notNull().references(() => users.id),
  batchId: ulidColumn().notNull().references(() => batches.id),
  batchOrder: int().notNull(),
  spectrumId: ulidColumn().references(() => spectra.id),
  lineTable: jsonColumn(lineTableSchema),
  recipeId: ulidColumn().references(() => recipes.id),
  stationId: ulidColumn().references(() => stations.id),
  instrumentId: ulidColumn().references(() => instruments.id),
  name: varchar({ length: 200 }).notNull(),
  note: varchar({ length: 2000 }).notNull().default(''),
  observedAt: timestampColumn(),
  band: varchar({ length: 64 }),
  revision: int().notNull().default(1),
  settings: jsonColumn(settingsSchema).notNull(),
  settingsHash: varchar({ length: 64 }).notNull(),
  phase: mysqlEnum(phases).notNull(),
  /** 0..1 */
  progress: double().notNull().default(0),
  /** Fencing token: a result is stored only by the attempt that holds it. */
  attempt: int().notNull().default(0),
  /** Attempts that earlier revisions took. */
  attemptsBefore: int().notNull().default(0),
  /** Raised by the reconciling task so that a lost job gets a new queue id. */
  dispatch: int().notNull().default(0),
  dispatchedAt: timestampColumn(),
  heartbeatAt: timestampColumn(),
  abortRequested: boolean().notNull().default(false),
  /** Why it is HELD or ERROR, in words. */
  reason: varchar({ length: 2000 }),
  /** It is in ERROR through a fault of the service, not of its input: an administrator can have it fitted again. */
  fault: boolean().notNull().default(false),
  createdAt: timestampColumn().notNull(),
  queuedAt: timestampColumn(),
  startedAt: timestampColumn(),
  finishedAt: timestampColumn(),
  /** Copies from the current result, for lists. */
  temperature: double(),
  uNoise: double(),
  uSystematic: double(),
  strengthSet: varchar({ length: 64 }),
  /** Bit i is flagNames[i]. */
  flagBits: int({ unsigned: true }).notNull().default(0),
  verdict: mysqlEnum(['accept', 'return']),
  version: int().notNull().default(1),
}, t => [
  index('retrievals_campaign_created').on(t.campaignId, t.id),
  index('retrievals_campaign_observed').on(t.campaignId, t.observedAt, t.id),
  index('retrievals_campaign_temperature').on(t.campaignId, t.temperature, t.id),
  index('retrievals_batch').on(t.batchId, t.batchOrder),
  index('retrievals_phase').on(t.phase, t.heartbeatAt),
  index('retrievals_owner').on(t.ownerId, t.id),
])

/** Final results: one per retrieval revision, never changed. */
export const retrievalResults = mysqlTable('retrieval_results', {
  retrievalId: ulidColumn().notNull().references(() => retrievals.id),
  revision: int().notNull(),
  attempt: int().notNull(),
  phase: mysqlEnum(['COMPLETED', 'ERROR', 'ABORTED']).notNull(),
  settings: jsonColumn(settingsSchema).notNull(),
  /** Null for ERROR and ABORTED. Without the spectrum picture, which is drawn again from the spectrum. */
  result: trustedJsonColumn<RetrievalResult>(),
  provenance: trustedJsonColumn<Provenance>(),
  reason: varchar({ length: 2000 }),
  note: varchar({ length: 2000 }).notNull().default(''),
  createdBy: ulidColumn().notNull().references(() => users.id),
  createdAt: timestampColumn().notNull(),
}, t => [primaryKey({ columns: [t.retrievalId, t.revision] })])

/** What event streams replay: ids grow, rows are swept after a week. */
export const retrievalEvents = mysqlTable('retrieval_events', {
  id: bigint({ mode: 'number' }).primaryKey().autoincrement(),
  retrievalId: ulidColumn().notNull(),
  batchId: ulidColumn().notNull(),
  kind: mysqlEnum(['phase', 'progress']).notNull(),
  revision: int().notNull(),
  phase: mysqlEnum(phases).notNull(),
  progress: double().notNull(),
  at: timestampColumn().notNull(),
}, t => [index('retrieval_events_batch').on(t.batchId, t.id), index('retrieval_events_retrieval').on(t.retrievalId, t.id)])

export const reviews = mysqlTable('reviews', {
  id: ulidColumn().primaryKey(),
  retrievalId: ulidColumn().notNull().references(() => retrievals.id),
  revision: int().notNull(),
  reviewerId: ulidColumn().notNull().references(() => users.id),
  verdict: mysqlEnum(['accept', 'return']).notNull(),
  note: varchar({ length: 2000 }).notNull().default(''),
  createdAt: timestampColumn().notNull(),
}, t => [uniqueIndex('reviews_once').on(t.retrievalId, t.revision, t.reviewerId, t.createdAt)])
