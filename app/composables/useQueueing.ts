import type { SpectrumAbout } from '#shared/types/spectrum'
import type { LineTable } from '#shared/schemas/line-table'
import { useSubmissionCalls, type Submitted } from '~/queries/submission'
import type { useFileReading } from './useFileReading'
import { useSending } from './useSending'

interface Request { recipe?: string, settings?: Record<string, unknown> }

/** Stores what is not stored, queues it, and goes on to the batch or, for one, to its result. A retry repeats nothing. */
export function useQueueing(files: ReturnType<typeof useFileReading>) {
  const { upload, queue } = useSubmissionCalls()
  const keyOf = useIdempotencyKey()
  const { sent, total, send } = useSending({ entries: files.entries, patch: files.patch, upload })

  async function goOn({ batchId, ids }: Submitted) {
    await navigateTo(ids.length === 1 ? `/retrievals/${ids[0]}` : `/batches/${batchId}`)
  }
  async function queueBody(campaign: string, body: Record<string, unknown>) {
    const submitted = await queue(campaign, body, keyOf({ campaign, ...body }))
    await goOn(submitted)
  }
  const form = useSubmit(async (campaign: string, request: Request, note: string, what: { place: Partial<SpectrumAbout> } | { table: LineTable }) => {
    const common = { ...request, ...(note.trim() ? { note: note.trim() } : {}) }
    if ('table' in what) return queueBody(campaign, { ...common, lineTable: what.table })
    const spectrumIds = await send(campaign, what.place)
    if (spectrumIds.length) await queueBody(campaign, { ...common, spectrumIds: [...new Set(spectrumIds)] })
  })
  return { ...form, sent, total }
}
