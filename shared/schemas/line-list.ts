import * as z from 'zod'

export const lineListParams = z.strictObject({ id: z.string().min(1).max(64) })

export const strengthSetSchema = z.object({
  name: z.string(),
  title: z.string(),
  citation: z.string(),
  absolute: z.boolean(),
  note: z.string().optional(),
})

export const lineListSummarySchema = z.object({
  id: z.string(),
  version: z.string(),
  title: z.string(),
  species: z.string(),
  licence: z.string(),
  recommendedObservable: z.string(),
  strengthSets: z.array(strengthSetSchema),
  bands: z.array(z.object({ id: z.string(), title: z.string(), recommendedLines: z.array(z.string()), lineCount: z.int() })),
})

const componentSchema = z.object({
  component: z.string(),
  /** Vacuum, cm^-1. */
  wavenumber: z.number(),
  termUpper: z.number(),
  termLower: z.number(),
  gUpper: z.number(),
  gLower: z.number(),
  strengths: z.record(z.string(), z.number()),
})

export const lineListSchema = lineListSummarySchema.omit({ bands: true }).extend({
  energyZero: z.string(),
  provenance: z.array(z.string()),
  bands: z.array(z.object({
    id: z.string(),
    title: z.string(),
    caution: z.string(),
    recommendedLines: z.array(z.string()),
    lines: z.array(z.object({ label: z.string(), branch: z.string(), components: z.array(componentSchema) })),
  })),
  levels: z.array(z.object({ energy: z.number(), degeneracy: z.number() })).optional(),
})
