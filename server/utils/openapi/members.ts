import { campaignParams, memberChangeSchema, memberParams, memberRemovalQuery, memberViewSchema } from '#shared/schemas/campaign'
import { acceptInvitationSchema, campaignInvitationParams, invitationOfferSchema, invitationOutcomeSchema, invitationTokenSchema, invitationViewSchema, inviteToCampaignSchema, resendInvitationSchema } from '#shared/schemas/invitation'
import { pageQuerySchema, pageSchema } from '#shared/schemas/paging'
import type { ApiRoute } from './types'

const base = '/api/campaigns/{slug}'

export const memberRoutes: ApiRoute[] = [
  {
    method: 'get', path: `${base}/members`, area: 'members', access: 'read', who: 'see', summary: 'The members of a campaign.', params: campaignParams, query: pageQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(memberViewSchema) } },
  },
  {
    method: 'patch', path: `${base}/members/{userId}`, area: 'members', access: 'submit', who: 'manage-members', summary: 'Change a member\'s role (lead); the only lead keeps it.', params: memberParams, body: memberChangeSchema,
    answers: { 200: { description: 'The member as it stands now.', schema: memberViewSchema } },
    errors: [409],
  },
  {
    method: 'delete', path: `${base}/members/{userId}`, area: 'members', access: 'submit', who: 'manage-members', summary: 'Remove a member (lead); what they submitted stays.', params: memberParams, query: memberRemovalQuery,
    answers: { 204: { description: 'Removed.' } },
    errors: [409],
  },
  {
    method: 'post', path: `${base}/leave`, area: 'members', access: 'submit', who: 'see', summary: 'Leave a campaign; its only lead hands it on first.', params: campaignParams,
    answers: { 204: { description: 'Left.' } },
    errors: [409],
  },
]

export const invitationRoutes: ApiRoute[] = [
  {
    method: 'get', path: `${base}/invitations`, area: 'members', access: 'read', who: 'manage-members', summary: 'The invitations to a campaign, the newest first (lead).', params: campaignParams, query: pageQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(invitationViewSchema) } },
  },
  {
    method: 'post', path: `${base}/invitations`, area: 'members', access: 'submit', who: 'manage-members', summary: 'Invite an address by mail (lead); the answer does not tell whether it has an account.', params: campaignParams, body: inviteToCampaignSchema,
    answers: { 201: { description: 'Invited; the mail is on its way.', schema: invitationViewSchema } },
    errors: [409, 429],
  },
  {
    method: 'post', path: `${base}/invitations/{id}/resend`, area: 'members', access: 'submit', who: 'manage-members', summary: 'Send an invitation again with a new link (lead); the old link ends.', params: campaignInvitationParams, body: resendInvitationSchema,
    answers: { 200: { description: 'Sent again.', schema: invitationViewSchema } },
    errors: [409, 429],
  },
  {
    method: 'delete', path: `${base}/invitations/{id}`, area: 'members', access: 'submit', who: 'manage-members', summary: 'Withdraw an invitation (lead).', params: campaignInvitationParams,
    answers: { 204: { description: 'Withdrawn.' } },
    errors: [409],
  },
  {
    method: 'post', path: '/api/invitations/look', area: 'members', access: 'public', who: 'anyone', summary: 'What an invitation link offers.', body: invitationTokenSchema,
    answers: { 200: { description: 'The offer.', schema: invitationOfferSchema } },
    errors: [404, 409],
  },
  {
    method: 'post', path: '/api/invitations/accept', area: 'members', access: 'public', who: 'anyone', summary: 'Accept an invitation with a new account.', body: acceptInvitationSchema,
    answers: { 201: { description: 'The account is made.', schema: invitationOutcomeSchema } },
    errors: [404, 409],
  },
  {
    method: 'post', path: '/api/invitations/join', area: 'members', access: 'submit', who: 'page', summary: 'Accept an invitation with the account one is signed in with, which must have the invited address.', body: invitationTokenSchema,
    answers: { 200: { description: 'Joined.', schema: invitationOutcomeSchema } },
    errors: [404, 409],
  },
]
