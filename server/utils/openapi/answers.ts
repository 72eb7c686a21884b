import * as z from 'zod'
import { flagNames } from '#shared/engine/types'
import { lineTableSchema } from '#shared/schemas/line-table'
import { settingsSchema } from '#shared/schemas/settings'
import { spectrumAboutSchema } from '#shared/schemas/spectrum'
import { spectrumProblemSchema, spectrumViewSchema } from '#shared/schemas/spectrum-view'
import { phases } from '#shared/types/phases'
import { campaignRoles } from '#shared/types/roles'

/** What the retrieval routes answer, for the OpenAPI document: the types themselves are in shared/types. */
const number = z.number().nullable()
const time = z.iso.datetime()
const phase = z.enum(phases)
const interval = z.tuple([number, number]).describe('Null is an open side.')
const verdict = z.enum(['accept', 'return'])

export const retrievalRowSchema = z.object({
  id: z.string(),
  name: z.string(),
  campaign: z.object({ slug: z.string(), title: z.string() }),
  batchId: z.string(),
  owner: z.string(),
  station: z.string().nullable(),
  instrument: z.string().nullable(),
  recipe: z.string().nullable().describe('slug@version'),
  band: z.string().nullable(),
  observedAt: time.nullable(),
  createdAt: time,
  finishedAt: time.nullable(),
  revision: z.int(),
  phase,
  progress: z.number().min(0).max(1),
  reason: z.string().nullable(),
  temperature: number.describe('K'),
  uNoise: number.describe('K'),
  uSystematic: number.describe('K'),
  strengthSet: z.string().nullable(),
  flags: z.array(z.string()),
  verdict: verdict.nullable(),
})

const resultLineSchema = z.looseObject({
  label: z.string(),
  band: z.string(),
  termEnergy: z.number().describe('cm^-1'),
  wavenumber: z.number().describe('Vacuum, cm^-1.'),
  strength: z.number(),
  intensity: z.number(),
  sigma: number,
  model: number,
  residual: number,
  used: z.boolean(),
  reason: z.string().optional(),
})

export const resultSchema = z.looseObject({
  temperature: z.object({ value: z.number(), uNoise: z.number(), uSystematic: z.number(), interval68: interval, interval95: interval, unit: z.literal('K') }).nullable(),
  reason: z.string().optional().describe('Why there is no temperature.'),
  method: z.string(),
  strengthSet: z.string().nullable(),
  chi2: number,
  dof: z.int(),
  pValue: number,
  curvatureZ: number,
  leverArm: number,
  lines: z.array(resultLineSchema),
  flags: z.array(z.enum(flagNames)),
  cautions: z.array(z.string()),
  strengthSets: z.array(z.object({ name: z.string(), temperature: number, uNoise: number, comparisonOnly: z.boolean().optional() })),
  components: z.array(z.object({ name: z.string(), kelvin: z.number(), commonTo: z.enum(['line', 'band', 'instrument', 'campaign', 'all']) })),
})

export const provenanceSchema = z.object({
  engineVersion: z.string(),
  lineList: z.string().nullable(),
  lineListVersion: z.string().nullable(),
  strengthSet: z.string().nullable(),
  settingsHash: z.string(),
  inputSha256: z.string(),
  seed: z.int(),
})

export const retrievalDetailSchema = retrievalRowSchema.extend({
  note: z.string(),
  settings: settingsSchema,
  lineTable: lineTableSchema.nullable(),
  spectrum: z.object({ id: z.string(), name: z.string(), sha256: z.string(), format: z.string(), pixelCount: z.int(), about: spectrumAboutSchema, missing: z.array(z.string()), problem: spectrumProblemSchema.nullable(), version: z.int() }).nullable(),
  result: resultSchema.nullable(),
  provenance: provenanceSchema.nullable(),
  revisions: z.array(z.object({ revision: z.int(), phase, createdAt: time, createdBy: z.string(), note: z.string(), temperature: number, uNoise: number, comparisonOnly: z.boolean().optional() })),
  reviews: z.array(z.object({ revision: z.int(), verdict, note: z.string(), reviewer: z.string(), createdAt: time })),
  may: z.object({ abort: z.boolean(), revise: z.boolean(), review: z.boolean(), submit: z.boolean() }),
  role: z.enum(campaignRoles),
})

export const batchCountsSchema = z.object({
  id: z.string(),
  campaign: z.string(),
  createdAt: time,
  total: z.int(),
  byPhase: z.partialRecord(phase, z.int()),
  done: z.boolean(),
})

export const pictureSchema = z.object({
  wavelength: z.array(z.number()).describe('Vacuum nm.'),
  values: z.array(z.number()),
  model: z.array(number),
  continuum: z.array(number),
})

const deskList = z.object({ items: z.array(retrievalRowSchema), total: z.int() })
export const deskSchema = z.object({
  running: deskList,
  waitingForMe: deskList,
  needsMending: z.object({ items: z.array(spectrumViewSchema), total: z.int() }),
  cameBack: deskList,
  cameBackTo: z.enum(['me', 'campaigns']),
  waitingForMyReview: deskList,
  lastNight: z.array(z.object({ station: z.string(), campaign: z.string(), total: z.int(), byPhase: z.partialRecord(phase, z.int()) })),
})
