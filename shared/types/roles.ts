export const campaignRoles = ['reader', 'observer', 'analyst', 'lead'] as const
export type CampaignRole = (typeof campaignRoles)[number]
export const tokenScopes = ['read', 'submit'] as const
export type TokenScope = (typeof tokenScopes)[number]
export const mailPreferences = ['each', 'digest', 'none'] as const
/** each: one mail a result; digest: one a batch (single submissions still get theirs); none. */
export type MailPreference = (typeof mailPreferences)[number]

/** What can be done in a campaign; `own` means one's own submission. */
export const campaignActions = [
  'see', 'export', 'comment', 'upload', 'submit', 'abort-own', 'revise-own', 'abort-any', 'revise-any', 'review',
  'edit-equipment', 'edit-recipes', 'edit-campaign', 'manage-members', 'release', 'archive',
] as const
export type CampaignAction = (typeof campaignActions)[number]

/** What an administrator does for the service, on a page and not by token; it opens no campaign. */
export const serviceActions = ['manage-accounts', 'manage-line-lists', 'manage-queue', 'manage-storage'] as const
export type ServiceAction = (typeof serviceActions)[number]

/**
 * Who a call is for. anyone: no sign-in; account: signed in, one's own rows or those of one's campaigns; page: the same, but
 * not with a token; otherwise who may do this in the campaign, or for the service.
 */
export type Who = 'anyone' | 'account' | 'page' | CampaignAction | ServiceAction
