import * as z from 'zod'
import { observables } from '../engine/types'

const aNumber = 'Enter a number, with a point for decimals.'

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
    fwhm: z.number(aNumber).positive('A line width is above 0 nm.').max(1000, 'A line width is at most 1000 nm.').nullable().default(null),
  }).prefault({}),
  shift: z.enum(['free', 'fixed']).default('free'),
  continuumOrder: z.int('Enter a whole number from 0 to 8.').min(0, 'Enter a whole number from 0 to 8.').max(8, 'Enter a whole number from 0 to 8.').default(1),
  /** Excluded ranges, vacuum nm. */
  masks: z.array(z.tuple([z.number('Enter both ends of the range, in nm.'), z.number('Enter both ends of the range, in nm.')])).max(100, 'At most 100 ranges are left out.').default([]),
  temperatureRange: z.tuple([z.number(aNumber).positive('A temperature is above 0 K.'), z.number(aNumber).positive('A temperature is above 0 K.').max(1e6, 'A temperature is at most 1,000,000 K.')])
    .refine(([low, high]) => low < high, { message: 'The lower temperature must be below the upper one.' })
    .default([2, 20000]),
  /** Background temperature, K; brightness only. */
  Tbg: z.number(aNumber).min(0, 'A background is 0 K or more.').max(10000, 'A background is at most 10,000 K.').default(2.725),
  bandScales: z.enum(['own', 'common']).default('own'),
  populationPer: z.enum(['level', 'state']).default('level'),
  widthIn: z.enum(['wavelength', 'wavenumber', 'velocity']).nullable().default(null),
  signalIn: z.enum(['photons', 'energy']).nullable().default(null),
  robust: z.literal('none').default('none'),
  seed: z.int('Enter a whole number from 0 to 4,294,967,295.').min(0, 'Enter a whole number from 0 to 4,294,967,295.').max(2 ** 32 - 1, 'Enter a whole number from 0 to 4,294,967,295.').default(1),
})
export type RetrievalSettings = z.output<typeof settingsSchema>
export type RetrievalSettingsInput = z.input<typeof settingsSchema>
