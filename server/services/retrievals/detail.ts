import { isFinal } from '#shared/types/phases'
import type { RetrievalDetail } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { database } from '../../database/client'
import { readListed } from '../../database/retrievals/list'
import { findReviews, findRevisions, findShownResult, findSpectrum } from '../../database/retrievals/read'
import type { Actor } from '../accounts/actor'
import { mayChange, mayReview, maySubmit, retrievalFor, type RetrievalAccess } from './access'
import { rowView } from './view'

export async function retrievalDetail(actor: Actor, id: string): Promise<RetrievalDetail> {
  const access = await retrievalFor(actor, id)
  const { retrieval, role } = access
  const db = database()
  const [row, shown, revisions, reviews, spectrum] = await Promise.all([
    readListed(db, id), findShownResult(db, id), findRevisions(db, id), findReviews(db, id), retrieval.spectrumId ? findSpectrum(db, retrieval.spectrumId) : undefined,
  ])
  if (!row) throw new DomainError('not_found', 'There is no such retrieval.')
  return {
    ...rowView(row),
    note: retrieval.note,
    settings: retrieval.settings,
    lineTable: retrieval.lineTable,
    spectrum: spectrum ? { id: spectrum.id, name: spectrum.name, sha256: spectrum.sha256, format: spectrum.format, pixelCount: spectrum.pixelCount, about: spectrum.about, missing: spectrum.missing, problem: spectrum.problem, version: spectrum.version } : null,
    result: shown?.result ?? null,
    provenance: shown?.provenance ?? null,
    revisions: revisions.map(({ result, createdBy }) => ({
      revision: result.revision, phase: result.phase, createdAt: result.createdAt.toISOString(), createdBy, note: result.note,
      temperature: result.result?.temperature?.value ?? null, uNoise: result.result?.temperature?.uNoise ?? null,
    })),
    reviews: reviews.map(({ review, reviewer }) => ({ revision: review.revision, verdict: review.verdict, note: review.note, reviewer, createdAt: review.createdAt.toISOString() })),
    may: mayNow(actor, access),
    role,
  }
}

/** What both the role and the phase allow, with this sign-in or token. */
function mayNow(actor: Actor, access: RetrievalAccess): RetrievalDetail['may'] {
  const { retrieval, role, campaign } = access
  const { phase } = retrieval
  const canAbort = actor.scope === 'submit'
  const canChange = canAbort && campaign.archivedAt === null
  return {
    abort: canAbort && !isFinal(phase) && mayChange('abort', actor, role, retrieval),
    revise: canChange && isFinal(phase) && mayChange('revise', actor, role, retrieval),
    review: canChange && phase === 'COMPLETED' && mayReview(actor, access),
    submit: canChange && (phase === 'PENDING' || phase === 'HELD') && maySubmit(actor, role, retrieval),
  }
}
