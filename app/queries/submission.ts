import type { SubmitRetrievals } from '#shared/schemas/retrieval-submit'
import type { UploadItem } from '#shared/schemas/spectrum-view'
import type { SpectrumAbout } from '#shared/types/spectrum'

export interface Submitted { batchId: string, ids: string[] }

/** What the Submit page asks of the service. */
export function useSubmissionCalls() {
  const api = useApi()
  return {
    upload(campaign: string, files: File[], about: Partial<SpectrumAbout>) {
      const form = new FormData()
      form.append('about', JSON.stringify(about))
      for (const file of files) form.append('files', file, file.name)
      return api<{ items: UploadItem[] }>(`/api/campaigns/${campaign}/spectra`, { method: 'POST', body: form })
    },
    queue(campaign: string, body: Record<string, unknown> & Partial<SubmitRetrievals>, key: string) {
      return api<Submitted>(`/api/campaigns/${campaign}/retrievals`, { method: 'POST', body, headers: { 'idempotency-key': key } })
    },
  }
}
