import { DomainError } from '#shared/utils/domain-error'
import { database, type Transaction } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { writeLogbook } from '../../database/logbook/repository'
import type { Actor } from '../accounts/actor'
import { slugCandidates, slugOf } from './slug'

/**
 * The address made from a name. A name of which nothing can stand in an address gets the first free number; one that is
 * there already is left to the unique key, because two things of one name are rather a mistake.
 */
export async function slugFor(name: string, noun: string, isTaken: (slug: string) => Promise<boolean>): Promise<string> {
  const slug = slugOf(name)
  if (slug) return slug
  for (const candidate of slugCandidates(noun)) if (!await isTaken(candidate)) return candidate
  return noun
}

/** Stores a station or an instrument with its first entry in the logbook. */
export async function storeNew(actor: Actor, noun: string, row: { id: string, campaignId: string, slug: string }, detail: Record<string, unknown>, insert: (tx: Transaction) => Promise<void>): Promise<void> {
  try {
    await database().transaction(async (tx) => {
      await insert(tx)
      await writeLogbook(tx, { campaignId: row.campaignId, objectKind: noun, objectId: row.id, actorId: actor.userId, action: 'create', detail })
    })
  }
  catch (error) {
    if (isDuplicateEntry(error)) throw new DomainError('conflict', `This campaign has a ${noun} ${row.slug} already.`.replace('a instrument', 'an instrument'), [{ path: 'slug', message: 'This address is taken in this campaign.' }])
    throw error
  }
}
