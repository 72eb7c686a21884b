import * as z from 'zod'
import { spectrumFormats } from '../types/spectrum'
import { versionSchema } from './campaign'
import { ulidSchema } from './ids'
import { pageQuerySchema } from './paging'
import { spectrumAboutSchema } from './spectrum'

/** What is wrong with bytes that cannot be read, and how to mend it. */
export const spectrumProblemSchema = z.object({ code: z.string(), message: z.string(), where: z.string().optional() })

export const spectrumParams = z.strictObject({ id: ulidSchema })

/** What becomes of one uploaded file. */
export const uploadItemSchema = z.object({
  name: z.string(),
  ok: z.boolean(),
  /** There also for a file that could not be read and was kept to be mended. */
  id: z.string().optional(),
  /** What was understood: the file's own statements merged with what was said. */
  understood: z.object({ format: z.enum(spectrumFormats), pixelCount: z.int(), about: spectrumAboutSchema }).optional(),
  missing: z.array(z.enum(['axisUnit', 'medium', 'valueKind', 'columns'])),
  warnings: z.array(z.string()),
  error: spectrumProblemSchema.optional(),
})
export type UploadItem = z.output<typeof uploadItemSchema>
export const uploadAnswerSchema = z.object({ items: z.array(uploadItemSchema) })

export const spectrumPatchSchema = z.strictObject({ version: versionSchema, about: spectrumAboutSchema })
export type SpectrumPatch = z.output<typeof spectrumPatchSchema>

/** `problem=true`: those that need mending. */
export const spectraQuerySchema = pageQuerySchema.extend({ problem: z.enum(['true', 'false']).transform(text => text === 'true').optional() })
export type SpectraQuery = z.output<typeof spectraQuerySchema>

/** The version that the caller has read, where a request has no JSON body. */
export const versionQuerySchema = z.strictObject({ version: z.coerce.number().int().min(1) })

export const spectrumDataQuerySchema = z.strictObject({ points: z.coerce.number().int().min(10).max(20_000).default(2000) })

export const spectrumViewSchema = z.object({
  id: z.string(),
  campaign: z.string(),
  name: z.string(),
  sha256: z.string(),
  byteCount: z.int(),
  /** unknown: the bytes cannot be read, see `problem`. */
  format: z.enum([...spectrumFormats, 'unknown']),
  pixelCount: z.int(),
  /** Vacuum nm, once the axis is known. */
  wavelengthFrom: z.number().nullable(),
  wavelengthTo: z.number().nullable(),
  about: spectrumAboutSchema,
  missing: z.array(z.enum(['axisUnit', 'medium', 'valueKind', 'columns'])),
  warnings: z.array(z.string()),
  problem: spectrumProblemSchema.nullable(),
  /** The caller may say more of it, and replace or delete it while it has a problem. */
  mayMend: z.boolean(),
  observedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type SpectrumView = z.output<typeof spectrumViewSchema>

export const spectrumDataSchema = z.object({ axis: z.array(z.number()), values: z.array(z.number()), axisUnit: z.string().nullable(), medium: z.string().nullable() })
export type SpectrumData = z.output<typeof spectrumDataSchema>
