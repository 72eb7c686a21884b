import type { CampaignView } from '#shared/schemas/campaign'
import type { CampaignAccess } from '../../database/campaigns/access-queries'
import type { CampaignRow } from '../../database/campaigns/repository'

export const campaignView = ({ archivedAt, createdAt, ...row }: CampaignRow, { role, member }: Pick<CampaignAccess, 'role' | 'member'>): CampaignView =>
  ({ ...row, archivedAt: archivedAt?.toISOString() ?? null, createdAt: createdAt.toISOString(), role, member })
