import { database } from '../../database/client'
import { deleteIdempotencyKeysBefore } from '../../database/idempotency/repository'
import { deleteEventsBefore } from '../../database/retrievals/events'

const hourMs = 3600_000
export const idempotencyHours = 24
const eventHours = 7 * 24
const rowsAtOnce = 5000

/** Deletes what has had its time: events after a week, idempotency keys after a day. */
export async function sweep(): Promise<number> {
  await deleteIdempotencyKeysBefore(database(), new Date(Date.now() - idempotencyHours * hourMs))
  const before = new Date(Date.now() - eventHours * hourMs)
  let deleted = 0
  for (;;) {
    const count = await deleteEventsBefore(database(), before, rowsAtOnce)
    deleted += count
    if (count < rowsAtOnce) return deleted
  }
}
