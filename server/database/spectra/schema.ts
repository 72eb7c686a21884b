import { bigint, double, index, int, mysqlEnum, mysqlTable, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import type { MissingField, SpectrumAbout, SpectrumProblem } from '../../../shared/types/spectrum'
import { users } from '../accounts/schema'
import { campaigns, instruments, stations } from '../campaigns/schema'
import { timestampColumn, trustedJsonColumn, ulidColumn } from '../columns'

/** The uploaded bytes stay as they came (storage, by SHA-256 within the campaign); this row says how they are read. */
export const spectra = mysqlTable('spectra', {
  id: ulidColumn().primaryKey(),
  campaignId: ulidColumn().notNull().references(() => campaigns.id),
  ownerId: ulidColumn().notNull().references(() => users.id),
  stationId: ulidColumn().references(() => stations.id),
  instrumentId: ulidColumn().references(() => instruments.id),
  name: varchar({ length: 200 }).notNull(),
  sha256: varchar({ length: 64 }).notNull(),
  byteCount: bigint({ mode: 'number' }).notNull(),
  /** unknown: the bytes could not be read. */
  format: mysqlEnum(['text', 'fits', 'json', 'unknown']).notNull(),
  pixelCount: int().notNull(),
  /** nm in vacuum when the axis is known, for lists. */
  wavelengthFrom: double(),
  wavelengthTo: double(),
  about: trustedJsonColumn<SpectrumAbout>().notNull(),
  missing: trustedJsonColumn<MissingField[]>().notNull(),
  warnings: trustedJsonColumn<string[]>().notNull(),
  /** Why the bytes cannot be read; the row waits for its owner to mend, replace or delete them. */
  problem: trustedJsonColumn<SpectrumProblem>(),
  observedAt: timestampColumn(),
  createdAt: timestampColumn().notNull(),
  version: int().notNull().default(1),
}, t => [uniqueIndex('spectra_bytes').on(t.campaignId, t.sha256), index('spectra_campaign_time').on(t.campaignId, t.observedAt)])
