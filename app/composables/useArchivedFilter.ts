/** Archived things stay out of a list until they are asked for. */
export function useArchivedFilter<T extends { archivedAt: string | null }>(items: () => T[]) {
  const withArchived = ref(false)
  return {
    withArchived,
    archivedCount: computed(() => items().filter(item => item.archivedAt).length),
    shown: computed(() => items().filter(item => withArchived.value || !item.archivedAt)),
  }
}
