import { DomainError } from '#shared/utils/domain-error'

export { freeSlug, slugOf } from '#shared/utils/slug'

/** The slugs that `freeSlug` may come to. */
export const slugCandidates = (base: string): string[] => [base, ...Array.from({ length: 50 }, (_, index) => `${base}-${index + 2}`)]

export const slugTaken = (slug: string): DomainError =>
  new DomainError('conflict', `The address ${slug} is taken. Choose another one.`, [{ path: 'slug', message: 'This address is taken.' }])
