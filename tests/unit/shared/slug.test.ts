import { describe, expect, it } from 'vitest'
import { slugSchema } from '#shared/schemas/campaign'
import { freeSlug, slugOf } from '#shared/utils/slug'

describe('addresses made from titles', () => {
  it.each([
    ['Hollow Ridge, winter 2025/26', 'hollow-ridge-winter-2025-26'],
    ['  Ærø & Ñandú -- café  ', 'r-nandu-cafe'],
    ['氷の夜', ''],
    [`${'long '.repeat(30)}`, `${'long-'.repeat(11)}long`],
  ])('%s becomes %s', (title, slug) => {
    expect(slugOf(title)).toBe(slug)
  })

  it('are always accepted as addresses, whatever the title', () => {
    for (const title of ['A', 'Lantern  Point!', '---x---', 'ÅÄÖ', '1'.repeat(200), `${'a'.repeat(59)} b`]) {
      const slug = slugOf(title)
      if (slug) expect(slugSchema.safeParse(slug).success).toBe(true)
    }
  })

  it('step aside for those that are taken', () => {
    expect(freeSlug('night', [])).toBe('night')
    expect(freeSlug('night', ['night', 'night-2', 'night-4'])).toBe('night-3')
  })
})
