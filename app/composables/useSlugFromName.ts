import { slugOf } from '#shared/utils/slug'

/** The address of a new thing follows its name until somebody writes one. */
export function useSlugFromName<Key extends string>(values: Record<Key | 'slug', unknown>, nameKey: Key, fallback: string): void {
  const made = (name: unknown) => String(name ?? '').trim() ? slugOf(String(name)) || fallback : ''
  watch(() => values[nameKey], (name, before) => {
    if (values.slug === made(before)) (values as Record<'slug', unknown>).slug = made(name)
  })
}
