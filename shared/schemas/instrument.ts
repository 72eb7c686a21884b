import * as z from 'zod'
import { observables } from '../engine/types'
import { axisMedia, axisUnits, valueKinds } from '../types/spectrum'
import { slugSchema } from './campaign'

/** What an instrument says here is the team's own statement: spectra that do not say otherwise take it over. */
export const instrumentCreateSchema = z.strictObject({
  slug: slugSchema.optional(),
  name: z.string().trim().min(1, 'An instrument needs a name.').max(120),
  /** Slug of its station. */
  station: z.string().trim().min(1).max(64).nullable().default(null),
  axisUnit: z.enum(axisUnits).nullable().default(null),
  medium: z.enum(axisMedia).nullable().default(null),
  valueKind: z.enum(valueKinds).nullable().default(null),
  defaultObservable: z.enum(observables).nullable().default(null),
  /** nm */
  fwhm: z.number().positive().max(1000).nullable().default(null),
  notes: z.string().trim().max(20_000).default(''),
})
export type InstrumentCreate = z.output<typeof instrumentCreateSchema>

export const instrumentViewSchema = z.object({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  station: z.string().nullable(),
  axisUnit: z.enum(axisUnits).nullable(),
  medium: z.enum(axisMedia).nullable(),
  valueKind: z.enum(valueKinds).nullable(),
  defaultObservable: z.enum(observables).nullable(),
  fwhm: z.number().nullable(),
  notes: z.string(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type InstrumentView = z.output<typeof instrumentViewSchema>
