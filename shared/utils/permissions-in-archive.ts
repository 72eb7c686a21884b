import type { CampaignAction, CampaignRole } from '../types/roles'
import { may } from './permissions'

/** What is still done in an archived campaign: it is read, running work is stopped, people come and go, and it is brought back. */
export const allowedInArchive: readonly CampaignAction[] = ['see', 'export', 'abort-own', 'abort-any', 'manage-members', 'release', 'archive']

/** What the role allows in the campaign as it stands: an archived one is left as it is. */
export const mayIn = (campaign: { role: CampaignRole, archivedAt: string | Date | null } | null | undefined, action: CampaignAction): boolean =>
  campaign != null && may(campaign.role, action) && (campaign.archivedAt === null || allowedInArchive.includes(action))
