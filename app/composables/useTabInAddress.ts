/** Which tab is open stands in the address, so that a link leads to it and "back" comes back to it. */
export function useTabInAddress(first: string) {
  const route = useRoute()
  return computed<string>({
    get: () => typeof route.query.tab === 'string' ? route.query.tab : first,
    set: tab => void navigateTo({ query: { ...route.query, tab: tab === first ? undefined : tab } }, { replace: true }),
  })
}
