import * as z from 'zod'
import { observationTimeSchema } from './observation-time'
import { lineSchema } from './text'
import { airFormulas, axisMedia, axisUnits, valueKinds } from '../types/spectrum'

const column = z.int().min(0).max(63)
const shortText = lineSchema('This', 64)

/** What a person says about one spectrum or about all of an upload; whatever is left out is taken from the file or asked. */
export const spectrumAboutSchema = z.strictObject({
  axisUnit: z.enum(axisUnits, { message: `axisUnit is one of ${axisUnits.join(', ')}.` }).nullable(),
  medium: z.enum(axisMedia, { message: `medium is one of ${axisMedia.join(', ')}.` }).nullable(),
  airFormula: z.enum(airFormulas),
  valueKind: z.enum(valueKinds, { message: `valueKind is one of ${valueKinds.join(', ')}.` }).nullable(),
  valueUnit: shortText.nullable(),
  columns: z.strictObject({ axis: column, values: column, sigma: column.nullable() }).nullable(),
  observedAt: observationTimeSchema.nullable(),
  exposureSeconds: z.number().positive().max(1e7).nullable(),
  station: shortText.nullable(),
  instrument: shortText.nullable(),
  fullScale: z.number().positive().nullable(),
}).partial()
export type SpectrumAboutInput = z.output<typeof spectrumAboutSchema>

/** A long list of numbers. Stops at the first bad one, so that a hostile body cannot make a million messages. */
function numbersSchema(what: string) {
  const list = z.array(z.unknown(), { message: `${what} is a list of numbers.` }).superRefine((items, context) => {
    // 1e999 is valid JSON and reads as Infinity.
    const index = items.findIndex(item => !Number.isFinite(item))
    if (index >= 0) context.addIssue({ code: 'custom', path: [index], message: `${what}[${index}] is ${shown(items[index])}, not a finite number.` })
  })
  return list.meta({ items: { type: 'number' } }) as unknown as z.ZodType<number[], number[]>
}

/** The JSON body of a spectrum upload. */
export const jsonSpectrumSchema = z.strictObject({
  name: lineSchema('A name', 200, 'A spectrum needs a name.'),
  axis: numbersSchema('axis'),
  values: numbersSchema('values'),
  sigma: numbersSchema('sigma').nullable().optional(),
  ...spectrumAboutSchema.omit({ columns: true }).shape,
})
export type JsonSpectrum = z.output<typeof jsonSpectrumSchema>

const shown = (item: unknown) => typeof item === 'number' ? String(item) : JSON.stringify(item)?.slice(0, 40)
