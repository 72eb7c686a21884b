import type { CampaignAction, CampaignRole } from '../types/roles'

const reader = ['see', 'export'] as const
const observer = [...reader, 'comment', 'upload', 'submit', 'abort-own', 'revise-own'] as const
const analyst = [...observer, 'abort-any', 'revise-any', 'review', 'edit-equipment', 'edit-recipes'] as const
const lead = [...analyst, 'edit-campaign', 'manage-members', 'release', 'archive'] as const

/** The one table of who may do what inside a campaign; routes and pages both ask it. */
export const allowedActions: Record<CampaignRole, readonly CampaignAction[]> = { reader, observer, analyst, lead }

export const may = (role: CampaignRole | null | undefined, action: CampaignAction): boolean =>
  role != null && allowedActions[role].includes(action)
