import * as z from 'zod'
import { fixedSlug, lineOfText, numberBetween, slugParam, slugSchema, versionSchema } from './fields'

export const stationParams = z.strictObject({ slug: slugParam, station: slugParam })

/** Degrees north and east, metres above the sea; null for a source that is not on the ground. */
const fields = {
  name: lineOfText('The name', 120),
  latitude: numberBetween(-90, 90, 'A latitude is between -90 and 90 degrees; south is negative.').nullable(),
  longitude: numberBetween(-180, 360, 'A longitude is between -180 and 360 degrees east; west is negative.').nullable(),
  altitude: numberBetween(-500, 1e8, 'An altitude is between -500 and 100,000,000 metres.').nullable(),
}

interface Place { latitude: number | null, longitude: number | null }
export const halfPlaceMessage = 'State latitude and longitude both, or neither.'
/** Which of the two is missing, if one is. */
export const missingHalf = ({ latitude, longitude }: Place): keyof Place | null =>
  (latitude === null) === (longitude === null) ? null : latitude === null ? 'latitude' : 'longitude'

const wholePlace = (place: Place, context: z.RefinementCtx) => {
  const path = missingHalf(place)
  if (path) context.addIssue({ code: 'custom', path: [path], message: halfPlaceMessage })
}

export const stationFormSchema = z.strictObject({ slug: slugSchema, ...fields }).superRefine(wholePlace)
export type StationForm = z.output<typeof stationFormSchema>

export const stationCreateSchema = z.strictObject({
  /** Left out: made from the name. */
  slug: slugSchema.optional(),
  name: fields.name,
  latitude: fields.latitude.default(null),
  longitude: fields.longitude.default(null),
  altitude: fields.altitude.default(null),
}).superRefine(wholePlace)
export type StationCreate = z.output<typeof stationCreateSchema>

export const stationPatchSchema = z.strictObject(fields).partial().extend({ version: versionSchema, slug: fixedSlug('a station') })
export type StationPatch = z.output<typeof stationPatchSchema>

export const stationViewSchema = z.object({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  latitude: z.number().nullable(),
  longitude: z.number().nullable(),
  altitude: z.number().nullable(),
  archivedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  version: z.int(),
})
export type StationView = z.output<typeof stationViewSchema>

/** What came in during one night, noon to noon in the station's solar time, named by the date of its evening. */
export const stationNightSchema = z.object({
  night: z.iso.date(),
  /** The two solar noons in UTC. */
  from: z.iso.datetime(),
  to: z.iso.datetime(),
  total: z.int(),
  completed: z.int(),
  failed: z.int(),
})
export type StationNight = z.output<typeof stationNightSchema>

export const stationNightsQuerySchema = z.strictObject({
  limit: z.coerce.number().int().min(1).max(500).default(30),
  /** The last night seen: what came before it follows. */
  cursor: z.iso.date('The cursor is a night such as 2026-01-14.').optional(),
})
export type StationNightsQuery = z.output<typeof stationNightsQuerySchema>
