import * as z from 'zod'
import { pageQuerySchema } from './paging'

export const logbookQuerySchema = pageQuerySchema.extend({
  /** What it is about: `campaign:<id>`, `spectrum:<id>`, `retrieval:<id>`, ...; a recipe's covers all its versions. */
  object: z.string().regex(/^[a-z-]{1,32}:[0-9A-Z]{26}$/, 'Name the object as kind:id, for example spectrum:01J...').optional(),
  /** Slug of a campaign: everything in it. */
  campaign: z.string().min(1).max(64).optional(),
  /** Of a campaign: only things of this kind. */
  kind: z.string().regex(/^[a-z-]{1,32}$/, 'A kind is a word such as station.').optional(),
  /** Oldest first, or newest first with a minus. One thing's is told from its beginning unless said otherwise, a campaign's from its end. */
  sort: z.enum(['at', '-at']).optional(),
}).refine(query => (query.object === undefined) !== (query.campaign === undefined), { path: ['object'], message: 'Give exactly one of object and campaign.' })
export type LogbookQuery = z.output<typeof logbookQuerySchema>

export const logbookViewSchema = z.object({
  id: z.string(),
  at: z.iso.datetime(),
  /** Null: the service itself. */
  actor: z.string().nullable(),
  action: z.string(),
  detail: z.record(z.string(), z.unknown()),
  /** What it was done to, by the name it has now; name null when it is gone. */
  object: z.object({ kind: z.string(), id: z.string(), name: z.string().nullable(), address: z.string().nullable() }),
})
export type LogbookView = z.output<typeof logbookViewSchema>
