import * as z from 'zod'
import { observables } from '../engine/types'
import { axisMedia, axisUnits, valueKinds } from '../types/spectrum'
import { fixedSlug, lineOfText, longText, positiveNumber, slugParam, slugSchema, versionSchema } from './fields'

export const instrumentParams = z.strictObject({ slug: slugParam, instrument: slugParam })

/** What an instrument says here is the team's own statement: spectra that do not say otherwise take it over. */
const fields = {
  name: lineOfText('The name', 120),
  /** Slug of its station. */
  station: z.string().trim().min(1).max(64).nullable(),
  axisUnit: z.enum(axisUnits, `The axis unit is one of ${axisUnits.join(', ')}.`).nullable(),
  medium: z.enum(axisMedia, `The medium is one of ${axisMedia.join(', ')}.`).nullable(),
  valueKind: z.enum(valueKinds, `The values count one of ${valueKinds.join(', ')}.`).nullable(),
  defaultObservable: z.enum(observables).nullable(),
  /** Full width at half maximum of a line, nm. */
  fwhm: positiveNumber(1000, 'A line width is above 0 and at most 1000 nm.').nullable(),
  /** Wavelength over line width. */
  resolvingPower: positiveNumber(1e9, 'A resolving power is above 0 and at most 1,000,000,000.').nullable(),
  notes: longText('The notes'),
}

interface Resolution { fwhm: number | null, resolvingPower: number | null }
export const twiceResolvedMessage = 'State the line width or the resolving power, not both.'
export const resolvedTwice = ({ fwhm, resolvingPower }: Resolution): boolean => fwhm !== null && resolvingPower !== null

const resolvedOnce = (resolution: Resolution, context: z.RefinementCtx) => {
  if (resolvedTwice(resolution)) context.addIssue({ code: 'custom', path: ['resolvingPower'], message: twiceResolvedMessage })
}

export const instrumentFormSchema = z.strictObject({ slug: slugSchema, ...fields }).superRefine(resolvedOnce)
export type InstrumentForm = z.output<typeof instrumentFormSchema>

export const instrumentCreateSchema = z.strictObject({
  /** Left out: made from the name. */
  slug: slugSchema.optional(),
  name: fields.name,
  station: fields.station.default(null),
  axisUnit: fields.axisUnit.default(null),
  medium: fields.medium.default(null),
  valueKind: fields.valueKind.default(null),
  defaultObservable: fields.defaultObservable.default(null),
  fwhm: fields.fwhm.default(null),
  resolvingPower: fields.resolvingPower.default(null),
  notes: fields.notes.default(''),
}).superRefine(resolvedOnce)
export type InstrumentCreate = z.output<typeof instrumentCreateSchema>

export const instrumentPatchSchema = z.strictObject(fields).partial().extend({ version: versionSchema, slug: fixedSlug('an instrument') })
export type InstrumentPatch = z.output<typeof instrumentPatchSchema>

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
  resolvingPower: z.number().nullable(),
  notes: z.string(),
  archivedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type InstrumentView = z.output<typeof instrumentViewSchema>
