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
