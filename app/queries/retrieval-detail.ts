import type { SettingsPatch } from '#shared/schemas/retrieval-submit'
import type { SpectrumView } from '#shared/schemas/spectrum-view'
import type { PictureData, RetrievalDetail } from '#shared/types/retrieval'
import type { SpectrumAbout } from '#shared/types/spectrum'

export function useRetrievalDetail(id: MaybeRefOrGetter<string>) {
  const api = useApi()
  return useAsyncData(() => `retrieval:${toValue(id)}`, () => api<RetrievalDetail>(`/api/retrievals/${toValue(id)}`))
}

/** Some thousand points, so the browser fetches them and they are not written into the page. Null id: no picture. */
export function usePicture(id: MaybeRefOrGetter<string | null>) {
  const api = useApi()
  return useAsyncData(() => `picture:${toValue(id) ?? ''}`, async () => {
    const name = toValue(id)
    return name ? api<PictureData>(`/api/retrievals/${name}/picture`) : null
  }, { server: false })
}

export function useRetrievalActions(id: MaybeRefOrGetter<string>) {
  const api = useApi()
  const post = <T>(verb: string, body: Record<string, unknown> = {}) => api<T>(`/api/retrievals/${toValue(id)}/${verb}`, { method: 'POST', body })
  return {
    abort: () => post('abort'),
    submit: () => post('submit'),
    revise: (settings: SettingsPatch, note: string) => post<{ id: string, revision: number }>('revise', { settings, note }),
    review: (verdict: 'accept' | 'return', note: string) => post('review', { verdict, note }),
  }
}

export function useSpectrumCalls() {
  const api = useApi()
  return {
    get: (id: string) => api<SpectrumView>(`/api/spectra/${id}`),
    bytes: (id: string) => api<Blob>(`/api/spectra/${id}/bytes`, { responseType: 'blob' }),
    amend: (id: string, version: number, about: Partial<SpectrumAbout>) => api(`/api/spectra/${id}`, { method: 'PATCH', body: { version, about } }),
  }
}
