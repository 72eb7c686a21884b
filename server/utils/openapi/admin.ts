import { accountDetailSchema, accountListQuerySchema, mailListQuerySchema, managedAccountSchema, managedMailSchema, overviewSchema, queueViewSchema, retryAnswerSchema, retrySchema, standingChangeSchema, storageViewSchema } from '#shared/schemas/admin'
import { idParams } from '#shared/schemas/ids'
import { invitationViewSchema, inviteToServiceSchema, resendInvitationSchema } from '#shared/schemas/invitation'
import { pageQuerySchema, pageSchema } from '#shared/schemas/paging'
import type { ApiRoute } from './types'

const accounts = { area: 'administration', who: 'manage-accounts' } as const
const queue = { area: 'administration', who: 'manage-queue' } as const

/** For administrators of the service; none of it shows what is in a campaign. */
export const adminRoutes: ApiRoute[] = [
  {
    ...queue, method: 'get', path: '/api/admin/overview', access: 'read', summary: 'Versions, and how much there is of everything.',
    answers: { 200: { description: 'As it stands now.', schema: overviewSchema } },
  },
  {
    ...accounts, method: 'get', path: '/api/admin/accounts', access: 'read', summary: 'The accounts, the newest first.', query: accountListQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(managedAccountSchema) } },
  },
  {
    ...accounts, method: 'get', path: '/api/admin/accounts/{id}', access: 'read', summary: 'One account, with the campaigns that only it leads.', params: idParams,
    answers: { 200: { description: 'The account.', schema: accountDetailSchema } },
  },
  {
    ...accounts, method: 'patch', path: '/api/admin/accounts/{id}', access: 'submit', summary: 'Deactivate or reactivate an account, make it an administrator or take that back.', params: idParams, body: standingChangeSchema,
    answers: { 200: { description: 'The account as it stands now.', schema: accountDetailSchema } },
    errors: [409],
  },
  {
    ...accounts, method: 'get', path: '/api/admin/invitations', access: 'read', summary: 'The invitations to the service, the newest first.', query: pageQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(invitationViewSchema) } },
  },
  {
    ...accounts, method: 'post', path: '/api/admin/invitations', access: 'submit', summary: 'Invite an address to the service, as an administrator if wished.', body: inviteToServiceSchema,
    answers: { 201: { description: 'Invited; the mail is on its way.', schema: invitationViewSchema } },
    errors: [409, 429],
  },
  {
    ...accounts, method: 'post', path: '/api/admin/invitations/{id}/resend', access: 'submit', summary: 'Send an invitation again with a new link; the old link ends.', params: idParams, body: resendInvitationSchema,
    answers: { 200: { description: 'Sent again.', schema: invitationViewSchema } },
    errors: [409, 429],
  },
  {
    ...accounts, method: 'delete', path: '/api/admin/invitations/{id}', access: 'submit', summary: 'Withdraw an invitation.', params: idParams,
    answers: { 204: { description: 'Withdrawn.' } },
    errors: [409],
  },
  {
    ...queue, method: 'get', path: '/api/admin/queue', access: 'read', summary: 'The queue, retrievals by phase, and what is stuck or failed through the service.',
    answers: { 200: { description: 'As it stands now.', schema: queueViewSchema } },
  },
  {
    ...queue, method: 'post', path: '/api/admin/queue/retry', access: 'submit', summary: 'Have retrievals fitted again that the service failed or that are stuck.', body: retrySchema,
    answers: { 200: { description: 'One item for each id.', schema: retryAnswerSchema } },
  },
  {
    ...queue, method: 'get', path: '/api/admin/mails', access: 'read', summary: 'The outbox; without a state, what is not yet sent.', query: mailListQuerySchema,
    answers: { 200: { description: 'A page.', schema: pageSchema(managedMailSchema) } },
  },
  {
    ...queue, method: 'post', path: '/api/admin/mails/{id}/resend', access: 'submit', summary: 'Send a waiting or given-up mail at once.', params: idParams,
    answers: { 200: { description: 'Due now.', schema: managedMailSchema } },
    errors: [409],
  },
  {
    area: 'administration', who: 'manage-storage', method: 'get', path: '/api/admin/storage', access: 'read', summary: 'Stored bytes and files by campaign, and the free space.',
    answers: { 200: { description: 'As it stands now.', schema: storageViewSchema } },
  },
]
