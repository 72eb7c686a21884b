import * as z from 'zod'
import { lineTableSchema } from './line-table'
import { ulidSchema } from './ids'
import { settingsSchema } from './settings'
import { textSchema } from './text'

export const maxSpectraPerRequest = 1000

const note = textSchema('A note', 2000).default('')

/**
 * Only what the sender says: its defaults are not filled in, so that it can be laid over a recipe.
 * Parsed again by `settingsSchema` once it is merged.
 */
export const settingsPatchSchema = z.partialRecord(settingsSchema.keyof(), z.unknown())
export type SettingsPatch = z.output<typeof settingsPatchSchema>

/** `POST /api/campaigns/{slug}/retrievals`: exactly one of `spectrumIds` and `lineTable`. */
export const submitRetrievalsSchema = z.strictObject({
  spectrumIds: z.array(ulidSchema).min(1, 'Name at least one spectrum.').max(maxSpectraPerRequest, `At most ${maxSpectraPerRequest} spectra in one request.`).optional(),
  lineTable: lineTableSchema.optional(),
  /** `slug@version`; without a version the newest. */
  recipe: z.string().trim().min(1).max(100).optional(),
  settings: settingsPatchSchema.optional(),
  note,
  /** true: kept as drafts (PENDING) until they are submitted one by one. */
  hold: z.boolean().default(false),
}).refine(body => (body.spectrumIds === undefined) !== (body.lineTable === undefined), {
  message: 'Give exactly one of spectrumIds and lineTable.',
  path: ['spectrumIds'],
})
export type SubmitRetrievals = z.output<typeof submitRetrievalsSchema>

/** `POST /api/retrievals/{id}/revise`: what is not given stays as it was. */
export const reviseRetrievalSchema = z.strictObject({ settings: settingsPatchSchema, note })
export type ReviseRetrieval = z.output<typeof reviseRetrievalSchema>

export const reviewRetrievalSchema = z.strictObject({ verdict: z.enum(['accept', 'return']), note })
export type ReviewRetrieval = z.output<typeof reviewRetrievalSchema>
