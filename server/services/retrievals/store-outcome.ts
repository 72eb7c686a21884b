import { flagsToBits } from '#shared/engine/flags'
import type { RetrievalResult } from '#shared/engine/types'
import { database, type Transaction } from '../../database/client'
import type { ClaimedRetrieval } from '../../database/retrievals/claim'
import { insertEvents } from '../../database/retrievals/events'
import { finishExecution, insertResult } from '../../database/retrievals/finish'
import { findRetrieval } from '../../database/retrievals/read'
import { writeLogbook } from '../../database/logbook/repository'
import { announceResult } from '../outbox/announce-result'
import type { FitOutcome } from './fit'

/**
 * Stores the end of an execution with its event, logbook entry and mail, all or nothing, if this attempt still holds it.
 * An abort that came during the last chunk wins over the result.
 * @returns false when nothing was stored because somebody else holds or ended it
 */
export const storeOutcome = (claimed: ClaimedRetrieval, outcome: FitOutcome): Promise<boolean> =>
  database().transaction(async tx => await store(tx, claimed, outcome)
    || (outcome.phase !== 'ABORTED' && store(tx, claimed, aborted)))

export const aborted: FitOutcome = { phase: 'ABORTED', reason: 'Aborted during the fit.', result: null, provenance: null }

async function store(tx: Transaction, claimed: ClaimedRetrieval, given: FitOutcome): Promise<boolean> {
  const { retrieval } = claimed
  const outcome = given.phase === 'ABORTED' ? { ...given, reason: await wordLeft(tx, retrieval.id) ?? given.reason } : given
  const { id, revision, attempt, batchId, campaignId, note } = retrieval
  const { phase, reason, result, provenance } = outcome
  if (!await finishExecution(tx, { id, revision, attempt, phase, columns: columnsOf(outcome) })) return false
  await insertResult(tx, { retrievalId: id, revision, attempt, phase, settings: retrieval.settings, result, provenance, reason, note, createdBy: retrieval.ownerId, createdAt: new Date() })
  await insertEvents(tx, [{ retrievalId: id, batchId, revision, phase, progress: 1 }])
  await writeLogbook(tx, {
    campaignId, objectKind: 'retrieval', objectId: id, actorId: null, action: 'finish',
    detail: { revision, phase, temperature: result?.temperature?.value ?? null, ...(reason ? { reason } : {}) },
  })
  if (phase !== 'ABORTED') await announceResult(tx, claimed, phase)
  return true
}

/** Whoever asked for the abort left their name in the reason. */
const wordLeft = async (tx: Transaction, id: string): Promise<string | null> => (await findRetrieval(tx, id))?.reason ?? null

/** What lists show. An aborted revision leaves the columns of the one before. */
function columnsOf({ phase, reason, result, fault = false }: FitOutcome) {
  if (phase === 'ABORTED') return { reason }
  return {
    reason,
    fault,
    temperature: result?.temperature?.value ?? null,
    uNoise: result?.temperature?.uNoise ?? null,
    uSystematic: result?.temperature?.uSystematic ?? null,
    strengthSet: result?.strengthSet ?? null,
    flagBits: result ? flagsToBits(result.flags) : 0,
    verdict: null,
    ...(result ? { band: bandsOf(result) } : {}),
  }
}

export function bandsOf(result: RetrievalResult): string | null {
  const bands = [...new Set(result.lines.filter(line => line.used).map(line => line.band))]
  return bands.length > 0 ? bands.join('+').slice(0, 64) : null
}
