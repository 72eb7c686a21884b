import type { CampaignView } from '#shared/schemas/campaign'
import type { CampaignRole } from '#shared/types/roles'
import type { CampaignRow } from '../../database/campaigns/repository'

export const campaignView = (row: CampaignRow, role: CampaignRole): CampaignView => ({
  id: row.id,
  slug: row.slug,
  title: row.title,
  kind: row.kind,
  description: row.description,
  selfReview: row.selfReview,
  archivedAt: row.archivedAt?.toISOString() ?? null,
  createdAt: row.createdAt.toISOString(),
  version: row.version,
  role,
})
