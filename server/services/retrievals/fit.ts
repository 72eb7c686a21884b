import { engineVersion } from '#shared/engine/version'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { retrieveFromSpectrum } from '#shared/engine/retrieve/from-spectrum'
import type { RetrievalResult } from '#shared/engine/types'
import type { FieldProblem } from '#shared/types/error-codes'
import type { Provenance } from '#shared/types/retrieval'
import { DomainError } from '#shared/utils/domain-error'
import { prepareFromSpectrum } from '#shared/utils/retrieval/from-spectrum'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import type { ClaimedRetrieval } from '../../database/retrievals/claim'
import { getLineList } from '../line-lists/index'
import { loadSpectrumForFit } from '../spectra/load-for-fit'
import { contentHash } from './hash'

export interface FitOutcome {
  phase: 'COMPLETED' | 'ERROR' | 'ABORTED'
  reason: string | null
  result: RetrievalResult | null
  provenance: Provenance | null
}
type Checkpoint = () => Promise<void>

/**
 * Fits one claimed retrieval; `checkpoint` is passed between the stages and may throw.
 * A fit without a temperature is an ERROR with its reason, and keeps its result, so that the lines can be looked at.
 */
export async function runFit(claimed: ClaimedRetrieval, checkpoint: Checkpoint): Promise<FitOutcome> {
  const { retrieval } = claimed
  await checkpoint()
  const { result, inputSha256 } = retrieval.lineTable
    ? await fitTable(claimed, checkpoint)
    : await fitSpectrum(claimed, checkpoint)
  await checkpoint()
  const failed = result.temperature === null
  return {
    phase: failed ? 'ERROR' : 'COMPLETED',
    reason: failed ? result.reason ?? 'No temperature could be found.' : null,
    result: withoutPicture(result),
    provenance: await provenanceOf(claimed, result, inputSha256),
  }
}

interface Fitted { result: RetrievalResult, inputSha256: string }

async function fitTable({ retrieval }: ClaimedRetrieval, checkpoint: Checkpoint): Promise<Fitted> {
  const { lineTable, settings } = retrieval
  if (!lineTable) throw new DomainError('validation_failed', 'This retrieval has neither a spectrum nor a line table.')
  const prepared = prepareFromTable({ table: lineTable, settings, lineList: await lineListOf(lineTable.lineList ?? settings.lineList) })
  if ('problem' in prepared) throw cannotPrepare(prepared.problem)
  await checkpoint()
  return { result: retrieveFromLines(prepared.input), inputSha256: contentHash(lineTable) }
}

async function fitSpectrum({ retrieval }: ClaimedRetrieval, checkpoint: Checkpoint): Promise<Fitted> {
  const { spectrumId, settings } = retrieval
  if (!spectrumId) throw new DomainError('validation_failed', 'This retrieval has neither a spectrum nor a line table.')
  const spectrum = await loadSpectrumForFit(spectrumId)
  await checkpoint()
  const prepared = prepareFromSpectrum({ spectrum, settings, lineList: await lineListOf(settings.lineList) })
  if ('problem' in prepared) throw cannotPrepare(prepared.problem)
  await checkpoint()
  return { result: retrieveFromSpectrum(prepared.input), inputSha256: spectrum.sha256 }
}

const lineListOf = async (id: string | null | undefined) => id ? getLineList(id) : null

const cannotPrepare = (problems: FieldProblem[]) =>
  new DomainError('validation_failed', problems.slice(0, 5).map(problem => problem.message).join(' '), problems)

/** The picture is drawn again from the spectrum and the measurement when somebody looks. */
function withoutPicture(result: RetrievalResult): RetrievalResult {
  if (!result.spectrum) return result
  return { ...result, spectrum: { ...result.spectrum, picture: { wavelength: [], values: [], model: [], continuum: [] } } }
}

async function provenanceOf({ retrieval }: ClaimedRetrieval, result: RetrievalResult, inputSha256: string): Promise<Provenance> {
  const lineList = await lineListOf(retrieval.lineTable?.lineList ?? retrieval.settings.lineList)
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
