import * as z from 'zod'
import { phases } from '../types/phases'
import { campaignRoles } from '../types/roles'
import { versionSchema } from './campaign'
import { ulidSchema } from './ids'
import { pageQuerySchema } from './paging'

export const accountStates = ['all', 'active', 'deactivated', 'administrator'] as const
export const accountListQuerySchema = pageQuerySchema.extend({
  /** Part of a name or address. */
  q: z.string().trim().max(200).default(''),
  state: z.enum(accountStates).default('all'),
})
export type AccountListQuery = z.output<typeof accountListQuerySchema>
export type AccountFilter = Pick<AccountListQuery, 'q' | 'state'>

export const standingChangeSchema = z.strictObject({
  version: versionSchema,
  active: z.boolean().optional(),
  isAdministrator: z.boolean().optional(),
  /** For every campaign that only this account leads: which member leads it from now on. */
  successors: z.array(z.strictObject({ campaign: z.string().max(64), userId: ulidSchema })).max(500).default([]),
})
export type StandingChange = z.output<typeof standingChangeSchema>

const time = z.iso.datetime()

export const managedAccountSchema = z.object({
  id: z.string(),
  email: z.string(),
  name: z.string(),
  isAdministrator: z.boolean(),
  active: z.boolean(),
  deactivatedAt: time.nullable(),
  createdAt: time,
  /** By a page or by a token; null: never. */
  lastSeenAt: time.nullable(),
  campaigns: z.int(),
  version: z.int(),
})
export type ManagedAccount = z.output<typeof managedAccountSchema>

export const accountDetailSchema = managedAccountSchema.extend({
  /** Campaigns that nobody else leads, with who could. */
  leadsAlone: z.array(z.object({
    campaign: z.string(),
    title: z.string(),
    members: z.array(z.object({ userId: z.string(), name: z.string(), email: z.string(), role: z.enum(campaignRoles) })),
  })),
})
export type AccountDetail = z.output<typeof accountDetailSchema>

export const troubles = ['fault', 'silent', 'overlong'] as const
export type Trouble = (typeof troubles)[number]

export const troubledSchema = z.object({
  id: z.string(),
  campaign: z.string().describe('Title; the content of the campaign stays its members\'.'),
  phase: z.enum(phases),
  trouble: z.enum(troubles).describe('fault: failed through the service; silent: executing without a sign of life; overlong: executing for far too long.'),
  since: time.nullable(),
  attempts: z.int(),
  reason: z.string().nullable(),
})
export type Troubled = z.output<typeof troubledSchema>

export const queueViewSchema = z.object({
  /** By BullMQ; null while Redis does not answer. */
  queue: z.object({ jobs: z.object({ waiting: z.int(), active: z.int(), delayed: z.int(), failed: z.int() }), workers: z.int() }).nullable(),
  byPhase: z.partialRecord(z.enum(phases), z.int()),
  oldestQueuedAt: time.nullable(),
  troubled: z.object({ items: z.array(troubledSchema), total: z.int() }),
})
export type QueueView = z.output<typeof queueViewSchema>

export const retrySchema = z.strictObject({ ids: z.array(ulidSchema).min(1, 'Name at least one retrieval.').max(200) })
export const retryAnswerSchema = z.object({ items: z.array(z.object({ id: z.string(), ok: z.boolean(), message: z.string().optional() })) })
export type RetryAnswer = z.output<typeof retryAnswerSchema>

export const mailStates = ['waiting', 'failed', 'sent'] as const
export const mailListQuerySchema = pageQuerySchema.extend({ state: z.enum(mailStates).optional() })
export type MailListQuery = z.output<typeof mailListQuerySchema>

export const managedMailSchema = z.object({
  id: z.string(),
  kind: z.string(),
  to: z.string().nullable(),
  state: z.enum(mailStates),
  attempts: z.int(),
  lastError: z.string().nullable(),
  createdAt: time,
  nextAttemptAt: time,
  sentAt: time.nullable(),
})
export type ManagedMail = z.output<typeof managedMailSchema>

export const storageViewSchema = z.object({
  /** Bytes; null where the storage does not tell. */
  space: z.object({ free: z.number(), total: z.number() }).nullable(),
  files: z.int(),
  bytes: z.number(),
  campaigns: z.array(z.object({ slug: z.string(), title: z.string(), archived: z.boolean(), files: z.int(), bytes: z.number() })),
})
export type StorageView = z.output<typeof storageViewSchema>

export const overviewSchema = z.object({
  versions: z.object({ app: z.string(), engine: z.string(), schema: z.string().nullable(), node: z.string(), database: z.string(), redis: z.string().nullable() }),
  accounts: z.object({ total: z.int(), active: z.int(), administrators: z.int() }),
  mails: z.object({ waiting: z.int(), sent: z.int(), failed: z.int() }),
  byPhase: z.partialRecord(z.enum(phases), z.int()),
  troubled: z.int(),
  workers: z.int().nullable(),
  storage: z.object({ files: z.int(), bytes: z.number(), free: z.number().nullable(), total: z.number().nullable() }),
})
export type Overview = z.output<typeof overviewSchema>
