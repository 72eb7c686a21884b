import { toApiError } from '~/utils/api-error'

export interface ApiOptions {
  method?: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE'
  query?: Record<string, unknown>
  body?: BodyInit | Record<string, unknown> | unknown[] | null
  headers?: Record<string, string>
  signal?: AbortSignal
  /** @default 'json' */
  responseType?: 'json' | 'blob' | 'text'
}
export type ApiCall = <T>(path: string, options?: ApiOptions) => Promise<T>

/** Calls our API. On the server the caller's cookie goes with it; every failure is an ApiError. */
export function useApi(): ApiCall {
  const fetcher = useRequestFetch() as unknown as ApiCall
  return async <T>(path: string, options?: ApiOptions) => {
    try {
      return await fetcher<T>(path, options)
    }
    catch (thrown) {
      throw toApiError(thrown)
    }
  }
}
