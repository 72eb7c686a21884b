import * as z from 'zod'
import { slugSchema } from './campaign'

export const stationCreateSchema = z.strictObject({
  slug: slugSchema.optional(),
  name: z.string().trim().min(1, 'A station needs a name.').max(120),
  /** Degrees north and east, metres above the sea; left out for a source that is not on the ground. */
  latitude: z.number().min(-90).max(90).nullable().default(null),
  longitude: z.number().min(-180).max(360).nullable().default(null),
  altitude: z.number().min(-500).max(1e8).nullable().default(null),
})
export type StationCreate = z.output<typeof stationCreateSchema>

export const stationViewSchema = z.object({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  latitude: z.number().nullable(),
  longitude: z.number().nullable(),
  altitude: z.number().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type StationView = z.output<typeof stationViewSchema>
