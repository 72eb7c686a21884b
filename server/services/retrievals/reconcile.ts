import { database, databasePool } from '../../database/client'
import { withNamedLock } from '../../database/lock'
import { findDoubtful, raiseDispatch, readDispatches } from '../../database/retrievals/reconcile'
import { config } from '../../config'
import { enqueueRetrievals, unknownToQueue } from '../../jobs/queue'
import { logger } from '../../logger'

const pageSize = 500

/** Dispatches again what the queue has lost. One process at a time does it; idempotent. @returns how many, or null when another was at it */
export const reconcile = (): Promise<number | null> =>
  withNamedLock(databasePool(), `trotline:reconcile:${config().instance}`, 0, async () => {
    let raised = 0
    for (let afterId = ''; ;) {
      const doubtful = await findDoubtful(database(), { afterId, limit: pageSize })
      if (doubtful.length > 0) raised += await dispatchAgain(doubtful)
      if (doubtful.length < pageSize) return raised
      afterId = doubtful.at(-1)!.id
    }
  })

async function dispatchAgain(doubtful: Awaited<ReturnType<typeof findDoubtful>>): Promise<number> {
  const lost = (await unknownToQueue(doubtful)).map(order => order.id)
  if (lost.length === 0) return 0
  await raiseDispatch(database(), lost)
  const orders = await readDispatches(database(), lost)
  await enqueueRetrievals(orders)
  logger.info({ count: orders.length }, 'dispatched again')
  return orders.length
}
