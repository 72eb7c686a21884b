import { DomainError } from '#shared/utils/domain-error'
import { config } from '../../config'
import { readClaimed, releaseRetrieval, takeRetrieval, type ClaimedRetrieval } from '../../database/retrievals/claim'
import { insertEvents } from '../../database/retrievals/events'
import { database } from '../../database/client'
import { logger } from '../../logger'
import { ThreadTimeLimit } from '../../threads/pool'
import { runFit, type FitOutcome } from './fit'
import { patiently } from './patience'
import { noteEnded, noteRunning } from './running'
import { aborted, storeOutcome } from './store-outcome'
import { AbortWanted, NoLongerHeld, watchOver } from './watch'

/** A retrieval whose process died so often takes its process with it. */
const maxAttempts = 20

/** Claims, fits and stores one revision. What cannot be claimed is somebody else's, or done. */
export async function executeRetrieval(order: { id: string, revision: number }, stopping: AbortSignal): Promise<void> {
  const claimed = await patiently(() => claim(order), stopping)
  if (!claimed) return
  const held = { id: order.id, attempt: claimed.retrieval.attempt }
  noteRunning(held)
  try {
    const outcome = await outcomeOf(claimed, stopping)
    if (outcome) await patiently(() => storeOutcome(claimed, outcome), stopping)
  }
  catch (error) {
    if (!stopping.aborted) throw error
    await giveBack(claimed)
  }
  finally {
    noteEnded(held)
  }
}

const claim = (order: { id: string, revision: number }): Promise<ClaimedRetrieval | undefined> => database().transaction(async (tx) => {
  if (!await takeRetrieval(tx, order)) return undefined
  const claimed = await readClaimed(tx, order.id)
  if (claimed) await insertEvents(tx, [{ retrievalId: order.id, batchId: claimed.retrieval.batchId, revision: order.revision, phase: 'EXECUTING', progress: 0 }])
  return claimed
})

/** What became of it; null when somebody else holds it by now. Only a stopping process throws. */
async function outcomeOf(claimed: ClaimedRetrieval, stopping: AbortSignal): Promise<FitOutcome | null> {
  if (claimed.retrieval.abortRequested) return aborted
  if (attemptsAt(claimed) > maxAttempts) return broken(`The worker stopped ${maxAttempts} times during this fit, so it was set aside. Change its settings or tell the administrator.`)
  const watch = watchOver(claimed, stopping)
  try {
    return await patiently(() => runFit(claimed, watch.signal), stopping)
  }
  catch (error) {
    if (stopping.aborted) throw error
    if (error instanceof NoLongerHeld) return null
    if (error instanceof AbortWanted) return aborted
    if (error instanceof ThreadTimeLimit) return failed(`The fit took longer than the ${config().limits.fitSeconds} s that one retrieval may take. Use fewer lines or pixels.`)
    if (error instanceof DomainError) return error.code === 'not_found' ? broken(error.message) : failed(error.message)
    logger.error({ err: error, retrieval: claimed.retrieval.id }, 'fit failed')
    return broken('The program failed on this input. The fault is in the service\'s log; tell the administrator the id of this retrieval.')
  }
  finally {
    watch.end()
  }
}

const attemptsAt = ({ retrieval }: ClaimedRetrieval) => retrieval.attempt - retrieval.attemptsBefore
const failed = (reason: string): FitOutcome => ({ phase: 'ERROR', reason, result: null, provenance: null })
/** Through no fault of the input: an administrator can have it fitted again. */
const broken = (reason: string): FitOutcome => ({ ...failed(reason), fault: true })

/** Best effort: if the database is away too, the stale heartbeat has the same effect later. */
async function giveBack({ retrieval }: ClaimedRetrieval): Promise<void> {
  try {
    await database().transaction(async (tx) => {
      if (!await releaseRetrieval(tx, retrieval)) return
      await insertEvents(tx, [{ retrievalId: retrieval.id, batchId: retrieval.batchId, revision: retrieval.revision, phase: 'QUEUED', progress: 0 }])
    })
  }
  catch (error) {
    logger.warn({ retrieval: retrieval.id, reason: (error as Error).message }, 'could not be given back; it will be found stale')
  }
}
