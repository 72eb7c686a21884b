import * as z from 'zod'
import { versionSchema } from './campaign'
import { ulidSchema } from './ids'
import { spectrumAboutSchema } from './spectrum'

export const spectrumParams = z.strictObject({ id: ulidSchema })

/** What becomes of one uploaded file. */
export const uploadItemSchema = z.object({
  name: z.string(),
  ok: z.boolean(),
  id: z.string().optional(),
  /** What was understood: the file's own statements merged with what was said. */
  understood: z.object({ format: z.enum(['text', 'fits', 'json']), pixelCount: z.int(), about: spectrumAboutSchema }).optional(),
  missing: z.array(z.enum(['axisUnit', 'medium', 'valueKind', 'columns'])),
  warnings: z.array(z.string()),
  error: z.object({ code: z.string(), message: z.string(), where: z.string().optional() }).optional(),
})
export type UploadItem = z.output<typeof uploadItemSchema>
export const uploadAnswerSchema = z.object({ items: z.array(uploadItemSchema) })

export const spectrumPatchSchema = z.strictObject({ version: versionSchema, about: spectrumAboutSchema })
export type SpectrumPatch = z.output<typeof spectrumPatchSchema>

export const spectrumDataQuerySchema = z.strictObject({ points: z.coerce.number().int().min(10).max(20_000).default(2000) })

export const spectrumViewSchema = z.object({
  id: z.string(),
  campaign: z.string(),
  name: z.string(),
  sha256: z.string(),
  byteCount: z.int(),
  format: z.enum(['text', 'fits', 'json']),
  pixelCount: z.int(),
  /** Vacuum nm, once the axis is known. */
  wavelengthFrom: z.number().nullable(),
  wavelengthTo: z.number().nullable(),
  about: spectrumAboutSchema,
  missing: z.array(z.enum(['axisUnit', 'medium', 'valueKind', 'columns'])),
  warnings: z.array(z.string()),
  observedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type SpectrumView = z.output<typeof spectrumViewSchema>

export const spectrumDataSchema = z.object({ axis: z.array(z.number()), values: z.array(z.number()), axisUnit: z.string().nullable(), medium: z.string().nullable() })
export type SpectrumData = z.output<typeof spectrumDataSchema>
