import { bitsToFlags } from '#shared/engine/flags'
import type { RetrievalRow } from '#shared/types/retrieval'
import type { ListedRetrieval } from '../../database/retrievals/list'

/** A row as the table of retrievals shows it. */
export const rowView = (row: ListedRetrieval): RetrievalRow => ({
  id: row.id,
  name: row.name,
  campaign: { slug: row.campaignSlug, title: row.campaignTitle },
  batchId: row.batchId,
  owner: row.owner,
  station: row.station,
  instrument: row.instrument,
  recipe: row.recipeSlug ? `${row.recipeSlug}@${row.recipeVersion}` : null,
  band: row.band,
  observedAt: row.observedAt?.toISOString() ?? null,
  createdAt: row.createdAt.toISOString(),
  finishedAt: row.finishedAt?.toISOString() ?? null,
  revision: row.revision,
  phase: row.phase,
  progress: row.progress,
  reason: row.reason,
  temperature: row.temperature,
  uNoise: row.uNoise,
  uSystematic: row.uSystematic,
  strengthSet: row.strengthSet,
  flags: bitsToFlags(row.flagBits),
  verdict: row.verdict,
})
