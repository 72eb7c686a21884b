import type { InstrumentView } from '#shared/schemas/instrument'
import type { InstrumentRow } from '../../database/campaigns/repository-equipment'

/** `station` is its slug. */
export const instrumentView = ({ campaignId: _, stationId: __, archivedAt, createdAt, ...instrument }: InstrumentRow, station: string | null): InstrumentView =>
  ({ ...instrument, station, archivedAt: archivedAt?.toISOString() ?? null, createdAt: createdAt.toISOString() })
