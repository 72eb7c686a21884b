import type { SubmitRetrievals } from '#shared/schemas/retrieval-submit'
import type { RetrievalSettings } from '#shared/schemas/settings'
import type { LineTable } from '#shared/schemas/line-table'
import type { FieldProblem } from '#shared/types/error-codes'
import type { SpectrumProblem } from '#shared/types/spectrum'
import { DomainError } from '#shared/utils/domain-error'
import { prepareFromTable } from '#shared/utils/retrieval/from-table'
import { config } from '../../config'
import { database } from '../../database/client'
import { findSpectraForSubmission } from '../../database/retrievals/read'
import { checkSettings } from '#shared/utils/check-settings'
import { getLineList } from '../line-lists/index'
import { placeOf } from '../spectra/place'
import { refuseArchivedPlaces } from './refuse-archived'

/** One thing to retrieve a temperature from, and what a row says of it. */
export interface SubmittedInput {
  name: string
  spectrumId: string | null
  lineTable: LineTable | null
  observedAt: Date | null
  stationId: string | null
  instrumentId: string | null
  band: string | null
  missing: string[]
  /** Why the spectrum's bytes cannot be read. */
  problem: SpectrumProblem | null
}

/** Finds and checks what was submitted, in the order given. Refuses what the engine could only refuse later. */
export async function inputsOf(campaignId: string, body: SubmitRetrievals, settings: RetrievalSettings): Promise<SubmittedInput[]> {
  refuseTooMany(body)
  if (body.lineTable) return [await tableInput(campaignId, body.lineTable, settings)]
  const problems = checkSettings(settings, settings.lineList === null ? null : await getLineList(settings.lineList))
  if (settings.lineList === null) problems.push({ path: 'settings.lineList', message: 'A spectrum needs a line list: name one in the settings or choose a recipe that does.' })
  refuse(problems)
  return spectrumInputs(campaignId, body.spectrumIds ?? [], settings)
}

async function tableInput(campaignId: string, table: LineTable, settings: RetrievalSettings): Promise<SubmittedInput> {
  const listId = table.lineList ?? settings.lineList
  const lineList = listId ? await getLineList(listId) : null
  if (listId && !lineList) throw new DomainError('unknown_line_list', `There is no line list ${listId}.`, [{ path: 'lineTable.lineList', message: 'No such line list.' }])
  const prepared = prepareFromTable({ table, settings, lineList })
  if ('problem' in prepared) refuse(prepared.problem.map(problem => ({ ...problem, path: `lineTable.${problem.path}` })))
  const { stationId, instrument } = await placeOf(campaignId, table, { within: 'lineTable' })
  return {
    stationId, instrumentId: instrument?.id ?? null, name: table.name ?? 'Line table', spectrumId: null, lineTable: table, missing: [], problem: null,
    observedAt: table.observedAt ? new Date(table.observedAt) : null, band: table.band ?? bandOf(settings),
  }
}

async function spectrumInputs(campaignId: string, ids: string[], settings: RetrievalSettings): Promise<SubmittedInput[]> {
  const found = new Map((await findSpectraForSubmission(database(), campaignId, ids)).map(row => [row.id, row]))
  refuse(ids.flatMap((id, index) => found.has(id) ? [] : [{ path: `spectrumIds.${index}`, message: 'This campaign has no such spectrum.' }]))
  await refuseArchivedPlaces(ids.flatMap(id => found.get(id) ?? []), index => `spectrumIds.${index}`)
  return ids.flatMap((id) => {
    const row = found.get(id)
    return row ? [{ ...row, spectrumId: id, lineTable: null, band: bandOf(settings) }] : []
  })
}

/** The service may take less than the format allows. */
function refuseTooMany({ lineTable, spectrumIds }: SubmitRetrievals): void {
  const { tableLines, spectra } = config().limits
  if (lineTable && lineTable.lines.length > tableLines) throw new DomainError('too_many', `A table takes at most ${tableLines} lines here; this one has ${lineTable.lines.length}.`, [{ path: 'lineTable.lines', message: `At most ${tableLines} lines.` }])
  if (spectrumIds && spectrumIds.length > spectra) throw new DomainError('too_many', `One request takes at most ${spectra} spectra here; send the rest in another.`, [{ path: 'spectrumIds', message: `At most ${spectra} spectra.` }])
}

const bandOf = ({ bands }: RetrievalSettings): string | null => bands.length > 0 ? bands.join('+').slice(0, 64) : null

function refuse(problems: FieldProblem[]): void {
  if (problems.length > 0) throw new DomainError('validation_failed', problems[0]!.message, problems)
}
