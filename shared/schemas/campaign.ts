import * as z from 'zod'
import { campaignKinds, visibilities } from '../types/campaign'
import { campaignRoles } from '../types/roles'
import { lineOfText, longText, slugParam, slugSchema, versionSchema } from './fields'
import { ulidSchema } from './ids'

export { slugSchema, versionSchema } from './fields'
export { campaignKinds, type CampaignKind } from '../types/campaign'

export const campaignParams = z.strictObject({ slug: slugParam })

const day = z.iso.date('Enter a date such as 2026-01-14.').nullable()

const fields = {
  title: lineOfText('The title', 200),
  kind: z.enum(campaignKinds, 'Choose what is observed.'),
  /** First and last day of observations, both inclusive; null: open. */
  startsOn: day,
  endsOn: day,
  description: longText('The description'),
  /** `members`: nobody else sees it. `service`: every signed-in account reads it. */
  visibility: z.enum(visibilities, 'Choose who may read it.'),
  /** May an analyst review a submission of their own? */
  selfReview: z.boolean(),
}

const datesInOrder = ({ startsOn, endsOn }: { startsOn: string | null, endsOn: string | null }) => !startsOn || !endsOn || startsOn <= endsOn
const outOfOrder = { path: ['endsOn'], message: 'The last day is before the first one.' }

/** A whole campaign as its form holds it. */
export const campaignFormSchema = z.strictObject({ slug: slugSchema, ...fields }).refine(datesInOrder, outOfOrder)
export type CampaignForm = z.output<typeof campaignFormSchema>

export const campaignCreateSchema = z.strictObject({
  ...fields,
  /** Left out: made from the title. */
  slug: slugSchema.optional(),
  kind: fields.kind.default('other'),
  startsOn: day.default(null),
  endsOn: day.default(null),
  description: fields.description.default(''),
  visibility: fields.visibility.default('members'),
  selfReview: fields.selfReview.default(false),
}).refine(datesInOrder, outOfOrder)
export type CampaignCreate = z.output<typeof campaignCreateSchema>

/** A changed slug keeps the old address working. */
export const campaignPatchSchema = z.strictObject({ slug: slugSchema, ...fields }).partial().extend({ version: versionSchema })
export type CampaignPatch = z.output<typeof campaignPatchSchema>

export const campaignViewSchema = z.object({
  id: z.string(),
  slug: z.string(),
  title: z.string(),
  kind: z.enum(campaignKinds),
  startsOn: z.iso.date().nullable(),
  endsOn: z.iso.date().nullable(),
  description: z.string(),
  visibility: z.enum(visibilities),
  selfReview: z.boolean(),
  archivedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
  /** The caller's role in it; reader for those who are no member of a campaign that every account may read. */
  role: z.enum(campaignRoles),
  member: z.boolean(),
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
