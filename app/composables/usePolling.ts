import { useDocumentVisibility, useIntervalFn } from '@vueuse/core'

/** Calls `refresh` every `everyMs` while `wanted` holds and the page is looked at. */
export function usePolling(wanted: () => boolean, refresh: () => unknown, everyMs = 4000): void {
  if (import.meta.server) return
  const visibility = useDocumentVisibility()
  useIntervalFn(() => {
    if (wanted() && visibility.value === 'visible') void refresh()
  }, everyMs)
}
