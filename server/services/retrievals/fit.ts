import { engineVersion } from '#shared/engine/version'
import type { RetrievalResult } from '#shared/engine/types'
import type { FieldProblem } from '#shared/types/error-codes'
import type { LineList } from '#shared/types/line-list'
import type { Provenance } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import type { FitAnswer } from '#shared/utils/retrieval/fit'
import { config } from '../../config'
import type { ClaimedRetrieval } from '../../database/retrievals/claim'
import { threads } from '../../threads/index'
import type { RunOptions } from '../../threads/pool'
import { getLineList } from '../line-lists/index'
import { loadSpectrumBytes } from '../spectra/load-for-fit'
import { contentHash } from './hash'

export interface FitOutcome {
  phase: 'COMPLETED' | 'ERROR' | 'ABORTED'
  reason: string | null
  result: RetrievalResult | null
  provenance: Provenance | null
  /** The service failed, not the fit. */
  fault?: boolean
}

/**
 * Fits one claimed retrieval in a thread; the signal ends it with its reason.
 * A fit without a temperature is an ERROR with its reason, and keeps its result, so that the lines can be looked at.
 */
export async function runFit(claimed: ClaimedRetrieval, signal: AbortSignal): Promise<FitOutcome> {
  const { retrieval } = claimed
  const lineList = await lineListOf(retrieval.lineTable?.lineList ?? retrieval.settings.lineList)
  const options = { lineList, seconds: config().limits.fitSeconds, signal }
  const { answer, inputSha256 } = retrieval.lineTable ? await fitTable(claimed, options) : await fitSpectrum(claimed, options)
  if (answer.problems) throw cannotPrepare(answer.problems)
  const { result } = answer
  const failed = result.temperature === null
  return {
    phase: failed ? 'ERROR' : 'COMPLETED',
    reason: failed ? result.reason ?? 'No temperature could be found.' : null,
    result: withoutPicture(result),
    provenance: provenanceOf(claimed, result, lineList, inputSha256),
  }
}

interface Fitted { answer: FitAnswer, inputSha256: string }

async function fitTable({ retrieval: { lineTable, settings } }: ClaimedRetrieval, options: RunOptions): Promise<Fitted> {
  if (!lineTable) throw new DomainError('validation_failed', 'This retrieval has neither a spectrum nor a line table.')
  return { answer: await threads().run('fitTable', { table: lineTable, settings }, options), inputSha256: contentHash(lineTable) }
}

async function fitSpectrum({ retrieval: { spectrumId, settings } }: ClaimedRetrieval, options: RunOptions): Promise<Fitted> {
  if (!spectrumId) throw new DomainError('validation_failed', 'This retrieval has neither a spectrum nor a line table.')
  const { bytes, name, about, sha256 } = await loadSpectrumBytes(spectrumId)
  return { answer: await threads().run('fitSpectrum', { bytes, name, about, settings }, options), inputSha256: sha256 }
}

const lineListOf = async (id: string | null | undefined) => id ? getLineList(id) : null

const cannotPrepare = (problems: FieldProblem[]) =>
  new DomainError('validation_failed', problems.slice(0, 5).map(problem => problem.message).join(' '), problems)

/** The picture is drawn again from the spectrum and the measurement when somebody looks. */
function withoutPicture(result: RetrievalResult): RetrievalResult {
  if (!result.spectrum) return result
  return { ...result, spectrum: { ...result.spectrum, picture: { wavelength: [], values: [], model: [], continuum: [] } } }
}

function provenanceOf({ retrieval }: ClaimedRetrieval, result: RetrievalResult, lineList: LineList | null, inputSha256: string): Provenance {
  return {
    engineVersion,
    lineList: lineList?.id ?? null,
    lineListVersion: lineList?.version ?? null,
    strengthSet: result.strengthSet,
    settingsHash: retrieval.settingsHash,
    inputSha256,
    seed: retrieval.settings.seed,
  }
}
