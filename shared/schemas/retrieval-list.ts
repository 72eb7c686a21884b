import * as z from 'zod'
import { flagNames } from '../engine/types'
import { phases } from '../types/phases'
import { ulidSchema } from './ids'

/** `?phase=ERROR&phase=HELD` and `?phase=ERROR,HELD` say the same. */
const several = <T extends z.ZodType>(item: T) => z.preprocess(
  value => value === undefined ? [] : [value].flat().flatMap(part => typeof part === 'string' ? part.split(',') : [part]).filter(part => part !== ''),
  z.array(item).max(50),
)
const blankIsAbsent = <T extends z.ZodType>(schema: T) => z.preprocess(value => value === '' ? undefined : value, schema.optional())

export const retrievalFilterSchema = z.strictObject({
  /** Slugs; empty: all that the caller may see. */
  campaign: several(z.string().trim().max(64)),
  phase: several(z.enum(phases)),
  /** Rows that carry every one of these flags. */
  flag: several(z.enum(flagNames)),
  band: blankIsAbsent(z.string().trim().max(64)),
  verdict: blankIsAbsent(z.enum(['accept', 'return', 'none'])),
  batch: blankIsAbsent(ulidSchema),
  /** Half-open range of the observation time. */
  from: blankIsAbsent(z.iso.datetime({ offset: true })),
  to: blankIsAbsent(z.iso.datetime({ offset: true })),
  /** Part of a name or note. */
  q: blankIsAbsent(z.string().trim().max(200)),
})
export type RetrievalFilter = z.output<typeof retrievalFilterSchema>

export const retrievalSorts = ['created', 'observed', 'temperature', 'name'] as const
export type RetrievalSort = (typeof retrievalSorts)[number]
/** A leading minus: descending. Rows without the value come last either way. */
export const retrievalSortKeys = retrievalSorts.flatMap(sort => [sort, `-${sort}`] as const)

const sort = z.enum(retrievalSortKeys).default('-created')

export const retrievalListQuerySchema = z.strictObject({
  ...retrievalFilterSchema.shape,
  sort,
  limit: z.coerce.number().int().min(1).max(500).default(50),
  cursor: blankIsAbsent(z.string().max(600)),
})
export type RetrievalListQuery = z.output<typeof retrievalListQuerySchema>

export const retrievalExportQuerySchema = z.strictObject({
  ...retrievalFilterSchema.shape,
  sort,
  format: z.enum(['csv']).default('csv'),
})
export type RetrievalExportQuery = z.output<typeof retrievalExportQuerySchema>
