import * as z from 'zod'
import { campaignRoles } from '../types/roles'
import { emailSchema, nameSchema, passwordSchema } from './account'
import { campaignParams } from './campaign'
import { ulidSchema } from './ids'

export const invitationStates = ['waiting', 'expired', 'accepted', 'withdrawn'] as const

export const inviteToCampaignSchema = z.strictObject({ email: emailSchema, role: z.enum(campaignRoles) })
export type InviteToCampaign = z.output<typeof inviteToCampaignSchema>

export const inviteToServiceSchema = z.strictObject({ email: emailSchema, asAdministrator: z.boolean().default(false) })
export type InviteToService = z.output<typeof inviteToServiceSchema>

export const campaignInvitationParams = campaignParams.extend({ id: ulidSchema })

export const resendInvitationSchema = z.strictObject({ round: z.int().min(1, 'Send the round of the invitation that you have read.') })

const tokenSchema = z.string().min(20, 'The invitation link is not complete.').max(200)
export const invitationTokenSchema = z.strictObject({ token: tokenSchema })
export const acceptInvitationSchema = z.strictObject({ token: tokenSchema, name: nameSchema, password: passwordSchema })
export type AcceptInvitation = z.output<typeof acceptInvitationSchema>

export const invitationViewSchema = z.object({
  id: z.string(),
  email: z.string(),
  /** In the campaign; null for an invitation to the service. */
  role: z.enum(campaignRoles).nullable(),
  asAdministrator: z.boolean(),
  state: z.enum(invitationStates),
  invitedBy: z.string(),
  createdAt: z.iso.datetime(),
  sentAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  acceptedAt: z.iso.datetime().nullable(),
  /** How often it was sent; only the newest link works. */
  round: z.int(),
})
export type InvitationView = z.output<typeof invitationViewSchema>

/** What the link's holder is told of the invitation. */
export const invitationOfferSchema = z.object({
  email: z.string(),
  /** The address has an account: sign in and join. */
  hasAccount: z.boolean(),
  campaign: z.string().nullable(),
  role: z.enum(campaignRoles).nullable(),
  asAdministrator: z.boolean(),
  invitedBy: z.string(),
  expiresAt: z.iso.datetime(),
})
export type InvitationOffer = z.output<typeof invitationOfferSchema>

export const invitationOutcomeSchema = z.object({
  email: z.string(),
  /** Slug; null for an invitation to the service. */
  campaign: z.string().nullable(),
  role: z.enum(campaignRoles).nullable(),
})
export type InvitationOutcome = z.output<typeof invitationOutcomeSchema>
