import type { ReviseRetrieval } from '#shared/schemas/retrieval-submit'
import type { RetrievalSettings } from '#shared/schemas/settings'
import { DomainError } from '#shared/utils/domain-error'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import { database } from '../../database/client'
import { writeLogbook } from '../../database/logbook/repository'
import { startRevision } from '../../database/retrievals/change'
import type { RetrievalRecord } from '../../database/retrievals/claim'
import { insertEvents } from '../../database/retrievals/events'
import { enqueueRetrieval } from '../../jobs/queue'
import type { Actor } from '../accounts/actor'
import { refuseArchivedCampaign } from '../campaigns/access'
import { getLineList } from '../line-lists/index'
import { checkSettings } from '#shared/utils/check-settings'
import { mayChange, refuseUnless, retrievalFor } from './access'
import { contentHash } from './hash'
import { mergeSettings } from './settings'

/** Queues the next revision under changed settings; the old result stays and is shown until the new one is there. */
export async function reviseRetrieval(actor: Actor, id: string, { settings: patch, note }: ReviseRetrieval): Promise<{ id: string, revision: number }> {
  const { retrieval, role, campaign } = await retrievalFor(actor, id)
  refuseUnless(mayChange('revise', actor, role, retrieval), 'You may revise your own retrievals; those of others are revised by an analyst or the lead.')
  refuseArchivedCampaign(campaign)
  const settings = mergeSettings(retrieval.settings, patch)
  await refuseUnusable(retrieval, settings)
  const revision = retrieval.revision + 1
  await database().transaction(async (tx) => {
    if (!await startRevision(tx, retrieval, { settings, settingsHash: contentHash(settings), note })) {
      throw new DomainError('wrong_phase', `A retrieval is revised when it has ended; this one is ${retrieval.phase}. Abort it first or wait.`)
    }
    await insertEvents(tx, [{ retrievalId: id, batchId: retrieval.batchId, revision, phase: 'QUEUED', progress: 0 }])
    await writeLogbook(tx, { campaignId: retrieval.campaignId, objectKind: 'retrieval', objectId: id, actorId: actor.userId, action: 'revise', detail: { revision, changed: patch, note } })
  })
  await enqueueRetrieval({ id, revision, dispatch: retrieval.dispatch + 1 })
  return { id, revision }
}

async function refuseUnusable({ lineTable }: RetrievalRecord, settings: RetrievalSettings): Promise<void> {
  const listId = lineTable?.lineList ?? settings.lineList
  const lineList = listId ? await getLineList(listId) : null
  const problems = lineTable ? tableProblems(prepareFromTable({ table: lineTable, settings, lineList })) : checkSettings(settings, lineList)
  if (problems.length > 0) throw new DomainError('validation_failed', problems[0]!.message, problems)
}

const tableProblems = (prepared: ReturnType<typeof prepareFromTable>) => 'problem' in prepared ? prepared.problem : []
