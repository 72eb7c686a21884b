import * as z from 'zod'
import { observables } from '../engine/types'

/** A recipe's body. Every field has a default, so `{}` is a recipe. */
export const settingsSchema = z.strictObject({
  observable: z.enum(observables).default('photon-emission'),
  lineList: z.string().trim().min(1).max(64).nullable().default(null),
  bands: z.array(z.string().trim().min(1).max(64)).max(40).default([]),
  /** Labels; empty: the list's recommended low-J set. */
  lines: z.array(z.string().trim().min(1).max(64)).max(2000).default([]),
  /** null: the list's recommended set that is complete for the chosen lines. */
  strengthSet: z.string().trim().min(1).max(64).nullable().default(null),
  method: z.enum(['envelope', 'spectrum', 'two-temperature', 'optical-depth']).default('envelope'),
  noise: z.enum(['absolute', 'relative', 'from-residuals']).default('absolute'),
  profile: z.strictObject({
    shape: z.literal('gaussian').default('gaussian'),
    /** nm; null: free. */
    fwhm: z.number().positive().max(1000).nullable().default(null),
  }).prefault({}),
  shift: z.enum(['free', 'fixed']).default('free'),
  continuumOrder: z.int().min(0).max(8).default(1),
  /** Excluded ranges, vacuum nm. */
  masks: z.array(z.tuple([z.number(), z.number()])).max(100).default([]),
  temperatureRange: z.tuple([z.number().positive(), z.number().positive().max(1e6)])
    .refine(([low, high]) => low < high, { message: 'The lower temperature must be below the upper one.' })
    .default([2, 20000]),
  /** Background temperature, K; brightness only. */
  Tbg: z.number().min(0).max(10000).default(2.725),
  bandScales: z.enum(['own', 'common']).default('own'),
  populationPer: z.enum(['level', 'state']).default('level'),
  widthIn: z.enum(['wavelength', 'wavenumber', 'velocity']).nullable().default(null),
  signalIn: z.enum(['photons', 'energy']).nullable().default(null),
  robust: z.literal('none').default('none'),
  seed: z.int().min(0).max(2 ** 32 - 1).default(1),
})
export type RetrievalSettings = z.output<typeof settingsSchema>
export type RetrievalSettingsInput = z.input<typeof settingsSchema>
