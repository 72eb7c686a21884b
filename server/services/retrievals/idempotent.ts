import { DomainError } from '#shared/utils/domain-error'
import { database, type Transaction } from '../../database/client'
import { isDuplicateEntry } from '../../database/duplicate'
import { deleteIdempotencyKey, findIdempotencyKey, insertIdempotencyKey } from '../../database/idempotency/repository'
import { idempotencyHours } from './sweep'

interface Keyed { userId: string, key: string, bodyHash: string }

/** The answer already given under this key, if any; another body under it is refused. */
export async function recallAnswer<T>({ userId, key, bodyHash }: Keyed): Promise<T | null> {
  const known = await findIdempotencyKey(database(), userId, key)
  if (!known) return null
  if (Date.now() - known.createdAt.getTime() > idempotencyHours * 3600_000) {
    await deleteIdempotencyKey(database(), userId, key)
    return null
  }
  if (known.bodyHash !== bodyHash) throw new DomainError('idempotency_mismatch', 'This Idempotency-Key came with another request before. Use a new key for a new request.')
  return known.answer as T
}

/**
 * Does the work in a transaction that also keeps its answer: of two requests with one key at the same time, the second
 * waits for the unique key and gets the first one's answer.
 */
export async function onceOnly<T>(keyed: Keyed | null, work: (tx: Transaction) => Promise<T>): Promise<{ answer: T, fresh: boolean }> {
  if (!keyed) return { answer: await database().transaction(work), fresh: true }
  const known = await recallAnswer<T>(keyed)
  if (known !== null) return { answer: known, fresh: false }
  try {
    const answer = await database().transaction(async (tx) => {
      const done = await work(tx)
      await insertIdempotencyKey(tx, { ...keyed, status: 202, answer: done })
      return done
    })
    return { answer, fresh: true }
  }
  catch (error) {
    const first = isDuplicateEntry(error) ? await recallAnswer<T>(keyed) : null
    if (first === null) throw error
    return { answer: first, fresh: false }
  }
}
