import { reservedSlugs } from '../schemas/fields'

/** "Hollow Ridge, winter" -> "hollow-ridge-winter"; empty when nothing of the text can stand in an address. */
export const slugOf = (text: string): string => {
  const slug = text.normalize('NFKD').replace(/[\u0300-\u036f]/g, '').toLowerCase()
    .replace(/[^a-z0-9]+/g, '-').replace(/^-+|-+$/g, '').slice(0, 60).replace(/-+$/, '')
  return (reservedSlugs as readonly string[]).includes(slug) ? `${slug}-1` : slug
}

/** The first of `base`, `base-2`, `base-3`, ... that is free. */
export function freeSlug(base: string, taken: readonly string[]): string {
  const used = new Set(taken)
  for (let n = 1; ; n++) {
    const slug = n === 1 ? base : `${base}-${n}`
    if (!used.has(slug)) return slug
  }
}
