import * as z from 'zod'
import { observables } from '../engine/types'
import { observationTimeSchema } from './observation-time'
import { lineSchema } from './text'

const finite = z.number()
/** One line of a submitted table: by label from a line list, or with its molecular data inline. */
export const tableLineSchema = z.strictObject({
  label: lineSchema('A label', 64, 'A line needs a label.'),
  band: lineSchema('A band', 64).optional(),
  intensity: finite,
  sigma: z.number().positive('sigma must be greater than zero; leave it out when it is not known.').nullable().optional(),
  wavenumber: z.number().positive().max(1e6).optional(),
  termUpper: z.number().min(-1e6).max(1e6).optional(),
  termLower: z.number().min(-1e6).max(1e6).optional(),
  gUpper: z.number().positive().max(1e6).optional(),
  gLower: z.number().positive().max(1e6).optional(),
  A: z.number().positive().optional(),
  scatteredWavenumber: z.number().positive().max(1e6).optional(),
  spinWeight: z.number().positive().max(1e4).optional(),
  J: z.int().min(0).max(1000).optional(),
  branch: z.enum(['stokes', 'anti-stokes']).optional(),
})

export const lineTableSchema = z.strictObject({
  observable: z.enum(observables, { message: `State the observable: one of ${observables.join(', ')}.` }),
  lineList: z.string().trim().min(1).max(64).optional(),
  band: lineSchema('A band', 64).optional(),
  strengthSet: z.string().trim().min(1).max(64).optional(),
  lines: z.array(tableLineSchema).min(1, 'The table has no line.').max(2000, 'A table takes at most 2000 lines.'),
  Tbg: z.number().min(0).max(10000).optional(),
  populationPer: z.enum(['level', 'state']).optional(),
  widthIn: z.enum(['wavelength', 'wavenumber', 'velocity']).optional(),
  signalIn: z.enum(['photons', 'energy']).optional(),
  /** Where and when the lines were observed, for series and pages. */
  name: lineSchema('A name', 200).optional(),
  observedAt: observationTimeSchema.optional(),
  station: z.string().trim().min(1).max(64).optional(),
  instrument: z.string().trim().min(1).max(64).optional(),
})
export type LineTable = z.output<typeof lineTableSchema>
export type TableLine = z.output<typeof tableLineSchema>
