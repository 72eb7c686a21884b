import * as z from 'zod'
import { pageQuerySchema } from './paging'

export const logbookQuerySchema = pageQuerySchema.extend({
  /** What it is about: `campaign:<id>`, `spectrum:<id>`, `retrieval:<id>`, ... */
  object: z.string().regex(/^[a-z-]{1,32}:[0-9A-Z]{26}$/, 'Name the object as kind:id, for example spectrum:01J...'),
})
export type LogbookQuery = z.output<typeof logbookQuerySchema>

export const logbookViewSchema = z.object({
  id: z.string(),
  at: z.iso.datetime(),
  /** Null: the service itself. */
  actor: z.string().nullable(),
  action: z.string(),
  detail: z.record(z.string(), z.unknown()),
})
export type LogbookView = z.output<typeof logbookViewSchema>
