import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { queueDraft } from '../../database/retrievals/change'
import { insertEvents } from '../../database/retrievals/events'
import { findSpectrum } from '../../database/retrievals/read'
import type { SpectrumRow } from '../../database/spectra/repository'
import { enqueueRetrieval } from '../../jobs/queue'
import type { Actor } from '../accounts/actor'
import { maySubmit, refuseUnless, retrievalFor } from './access'
import { refuseArchivedDraft } from './refuse-archived'
import { missingWords } from './submit'

/** Queues a draft, or one that waited for its owner to say what the file did not. */
export async function submitDraft(actor: Actor, id: string): Promise<{ id: string, revision: number }> {
  const { retrieval, role, campaign } = await retrievalFor(actor, id)
  refuseUnless(maySubmit(actor, role, retrieval), 'You may submit your own drafts; those of others are submitted by an analyst or the lead.')
  await refuseArchivedDraft(campaign, retrieval)
  const spectrum = retrieval.spectrumId ? await findSpectrum(database(), retrieval.spectrumId) : undefined
  if (spectrum?.problem) throw new DomainError('unreadable_spectrum', `Replace the file first. ${spectrum.problem.message}`)
  if (spectrum && spectrum.missing.length > 0) {
    throw new DomainError('incomplete_spectrum', `Complete the spectrum first. ${missingWords(spectrum.missing)}`, spectrum.missing.map(field => ({ path: `about.${field}`, message: missingWords([field]) })))
  }
  const { revision, dispatch, batchId, campaignId } = retrieval
  await database().transaction(async (tx) => {
    if (!await queueDraft(tx, retrieval, spectrum ? placeOf(spectrum) : {})) throw new DomainError('wrong_phase', `Only drafts and held retrievals are submitted; this one is ${retrieval.phase}.`)
    await insertEvents(tx, [{ retrievalId: id, batchId, revision, phase: 'QUEUED', progress: 0 }])
    await writeLogbook(tx, { campaignId, objectKind: 'retrieval', objectId: id, actorId: actor.userId, action: 'submit', detail: { revision } })
  })
  await enqueueRetrieval({ id, revision, dispatch })
  return { id, revision }
}

/** What was answered or replaced meanwhile goes with it. */
const placeOf = ({ name, observedAt, stationId, instrumentId }: SpectrumRow) => ({ name, observedAt, stationId, instrumentId })
