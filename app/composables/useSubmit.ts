import { toApiError, type ApiError } from '~/utils/api-error'

/** One form, one request at a time: `busy` while it runs, `error` when it failed. */
export function useSubmit<A extends unknown[], T>(work: (...args: A) => Promise<T>) {
  const busy = ref(false)
  const error = shallowRef<ApiError | null>(null)
  async function submit(...args: A): Promise<T | undefined> {
    if (busy.value) return
    busy.value = true
    error.value = null
    try {
      return await work(...args)
    }
    catch (thrown) {
      error.value = toApiError(thrown)
    }
    finally {
      busy.value = false
    }
  }
  return { busy, error, submit }
}
