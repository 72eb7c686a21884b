import type { SubmitRetrievals } from '#shared/schemas/retrieval-submit'
import type { RetrievalSettings } from '#shared/schemas/settings'
import type { Phase } from '#shared/types/phases'
import type { SpectrumProblem } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { insertBatch } from '../../database/batches/repository'
import { newId } from '../../database/ids'
import { writeLogbookEntries } from '../../database/logbook/repository'
import { insertEvents } from '../../database/retrievals/events'
import { insertRetrievals, type NewRetrieval } from '../../database/retrievals/insert'
import { enqueueRetrievals } from '../../jobs/queue'
import type { Actor } from '../accounts/actor'
import { campaignFor } from '../campaigns/access'
import { recipeByAddress } from '../recipes/index'
import { contentHash } from './hash'
import { onceOnly } from './idempotent'
import { mergeSettings } from './settings'
import { inputsOf, type SubmittedInput } from './submission-input'

export interface Submitted { batchId: string, ids: string[] }
interface Submission { actor: Actor, slug: string, body: SubmitRetrievals, idempotencyKey: string | null }

/** Stores a batch of retrievals, then queues them. What is committed is done, whether or not the queue is there. */
export async function submitRetrievals({ actor, slug, body, idempotencyKey }: Submission): Promise<Submitted> {
  const { campaign } = await campaignFor(actor, slug, 'submit')
  const keyed = idempotencyKey === null ? null : { userId: actor.userId, key: idempotencyKey, bodyHash: contentHash({ slug, body }) }
  const recipe = body.recipe ? await recipeByAddress(campaign.id, body.recipe) : null
  const settings = mergeSettings(recipe?.settings, body.settings)
  const inputs = await inputsOf(campaign.id, body, settings)
  const phases = phasesOf(actor, body, inputs)
  const settingsHash = contentHash(settings)

  const batchId = newId()
  const rows = inputs.map((input, batchOrder) => rowOf(input, {
    campaignId: campaign.id, ownerId: actor.userId, batchId, batchOrder, recipeId: recipe?.id ?? null, note: body.note, settings, settingsHash, phase: phases[batchOrder]!,
  }))
  const { answer, fresh } = await onceOnly<Submitted>(keyed, async (tx) => {
    await insertBatch(tx, { id: batchId, campaignId: campaign.id, ownerId: actor.userId, total: rows.length, note: body.note, createdAt: new Date() })
    await insertRetrievals(tx, rows)
    await insertEvents(tx, rows.map(row => ({ retrievalId: row.id, batchId, revision: 1, phase: row.phase, progress: 0 })))
    await writeLogbookEntries(tx, rows.map(row => ({
      campaignId: campaign.id, objectKind: 'retrieval', objectId: row.id, actorId: actor.userId, action: 'submit', detail: { batchId, phase: row.phase, recipe: body.recipe ?? null },
    })))
    return { batchId, ids: rows.map(row => row.id) }
  })
  if (fresh) await enqueueRetrievals(rows.filter(row => row.phase === 'QUEUED').map(({ id }) => ({ id, revision: 1, dispatch: 0 })))
  return answer
}

/** A person can answer what is missing at once and is asked to; a script's spectra wait for the owner. */
function phasesOf(actor: Actor, { hold }: SubmitRetrievals, inputs: SubmittedInput[]): Phase[] {
  if (hold) return inputs.map(() => 'PENDING')
  const waits = inputs.map(waitsFor)
  const fields = waits.flatMap((message, index) => message ? [{ path: `spectrumIds.${index}`, message }] : [])
  if (fields.length > 0 && actor.via === 'session') {
    const unreadable = inputs.some(({ problem }) => problem)
    throw new DomainError(unreadable ? 'unreadable_spectrum' : 'incomplete_spectrum', unreadable ? 'Some files cannot be read; mend or replace them first.' : 'Some spectra do not say all that a fit needs; complete them or keep them as drafts.', fields)
  }
  return waits.map(message => message ? 'HELD' : 'QUEUED')
}

/** What its owner has to do before it can be fitted, in words; null when nothing. */
export function waitsFor({ missing, problem }: { missing: string[], problem: SpectrumProblem | null }): string | null {
  if (problem) return `The file cannot be read. ${problem.message}`.slice(0, 2000)
  return missing.length > 0 ? missingWords(missing) : null
}

const words: Record<string, string> = { axisUnit: 'the unit of the axis', medium: 'air or vacuum', valueKind: 'photons or energy', columns: 'which columns to read' }
export const missingWords = (missing: string[]): string => `Not stated: ${missing.map(field => words[field] ?? field).join(', ')}.`

interface Common { campaignId: string, ownerId: string, batchId: string, batchOrder: number, recipeId: string | null, note: string, settings: RetrievalSettings, settingsHash: string, phase: Phase }

function rowOf(input: SubmittedInput, common: Common): NewRetrieval {
  const { name, spectrumId, lineTable, observedAt, stationId, instrumentId, band } = input
  const now = new Date()
  const queued = common.phase === 'QUEUED' ? now : null
  return {
    ...common, id: newId(), name, spectrumId, lineTable, observedAt, stationId, instrumentId, band,
    reason: common.phase === 'HELD' ? waitsFor(input) : null, createdAt: now, queuedAt: queued, dispatchedAt: queued,
  }
}
