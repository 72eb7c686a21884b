import type { StationView } from '#shared/schemas/station'
import type { StationRow } from '../../database/campaigns/repository-equipment'

export const stationView = ({ campaignId: _, archivedAt, createdAt, ...station }: StationRow): StationView =>
  ({ ...station, archivedAt: archivedAt?.toISOString() ?? null, createdAt: createdAt.toISOString() })
