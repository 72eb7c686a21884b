import * as z from 'zod'
import { campaignRoles } from '../types/roles'
import { ulidSchema } from './ids'

export const campaignKinds = ['airglow', 'atmosphere', 'interstellar', 'comet', 'laboratory', 'other'] as const
export type CampaignKind = (typeof campaignKinds)[number]

/** The part of an address that names a thing. */
export const slugSchema = z.string().trim().max(64)
  .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use small letters, digits and single hyphens, for example hollow-ridge.')

export const versionSchema = z.int().min(1, 'Send the version of the row that you changed.')

export const campaignParams = z.strictObject({ slug: z.string().min(1).max(64) })

export const campaignCreateSchema = z.strictObject({
  /** Left out: made from the title. */
  slug: slugSchema.optional(),
  title: z.string().trim().min(1, 'A campaign needs a title.').max(200),
  kind: z.enum(campaignKinds).default('other'),
  description: z.string().trim().max(20_000).default(''),
  selfReview: z.boolean().default(false),
})
export type CampaignCreate = z.output<typeof campaignCreateSchema>

export const campaignPatchSchema = z.strictObject({
  version: versionSchema,
  title: z.string().trim().min(1, 'A campaign needs a title.').max(200).optional(),
  kind: z.enum(campaignKinds).optional(),
  description: z.string().trim().max(20_000).optional(),
  selfReview: z.boolean().optional(),
})
export type CampaignPatch = z.output<typeof campaignPatchSchema>

export const campaignViewSchema = z.object({
  id: z.string(),
  slug: z.string(),
  title: z.string(),
  kind: z.enum(campaignKinds),
  description: z.string(),
  selfReview: z.boolean(),
  archivedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
  /** The caller's role in it. */
  role: z.enum(campaignRoles),
})
export type CampaignView = z.output<typeof campaignViewSchema>

export const memberParams = campaignParams.extend({ userId: ulidSchema })
export const memberChangeSchema = z.strictObject({ role: z.enum(campaignRoles), version: versionSchema })
export const memberRemovalQuery = z.strictObject({ version: z.coerce.number().pipe(versionSchema) })

export const memberViewSchema = z.object({
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(campaignRoles),
  since: z.iso.datetime(),
  /** False while the account is deactivated. */
  active: z.boolean(),
  version: z.int(),
})
export type MemberView = z.output<typeof memberViewSchema>
