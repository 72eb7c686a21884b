import type { RetrievalResult } from '../engine/types'
import type { RetrievalSettings } from '../schemas/settings'
import type { LineTable } from '../schemas/line-table'
import type { CampaignRole } from './roles'
import type { Phase } from './phases'
import type { SpectrumAbout, SpectrumProblem } from './spectrum'

/** What a number rests on: enough to make it again. */
export interface Provenance {
  engineVersion: string
  lineList: string | null
  lineListVersion: string | null
  strengthSet: string | null
  settingsHash: string
  inputSha256: string
  seed: number
}

/** One row of the retrievals table (`GET /api/retrievals`). Times RFC 3339 UTC with milliseconds. */
export interface RetrievalRow {
  id: string
  name: string
  campaign: { slug: string, title: string }
  batchId: string
  owner: string
  station: string | null
  instrument: string | null
  recipe: string | null
  band: string | null
  observedAt: string | null
  createdAt: string
  finishedAt: string | null
  revision: number
  phase: Phase
  progress: number
  reason: string | null
  temperature: number | null
  uNoise: number | null
  uSystematic: number | null
  strengthSet: string | null
  flags: string[]
  verdict: 'accept' | 'return' | null
}

/** `GET /api/retrievals/{id}` */
export interface RetrievalDetail extends RetrievalRow {
  note: string
  settings: RetrievalSettings
  /** Exactly one of the two. */
  lineTable: LineTable | null
  spectrum: { id: string, name: string, sha256: string, format: string, pixelCount: number, about: SpectrumAbout, missing: string[], problem: SpectrumProblem | null, version: number } | null
  /** Without `spectrum.picture`: see `GET /api/retrievals/{id}/picture`. */
  result: RetrievalResult | null
  provenance: Provenance | null
  revisions: { revision: number, phase: Phase, createdAt: string, createdBy: string, note: string, temperature: number | null, uNoise: number | null }[]
  reviews: { revision: number, verdict: 'accept' | 'return', note: string, reviewer: string, createdAt: string }[]
  /** What the caller may do with it. */
  may: { abort: boolean, revise: boolean, review: boolean, submit: boolean }
  role: CampaignRole
}

export interface Page<T> { items: T[], nextCursor: string | null, total: number }
export interface BatchCounts { id: string, campaign: string, createdAt: string, total: number, byPhase: Partial<Record<Phase, number>>, done: boolean }
/** Data of the server-sent events `phase` and `progress`; the closing `done` carries BatchCounts. */
export interface RetrievalEvent { retrievalId: string, revision: number, phase: Phase, progress: number, at: string }
export interface PictureData { wavelength: number[], values: number[], model: (number | null)[], continuum: (number | null)[] }
