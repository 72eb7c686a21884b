import type { MissingField, SpectrumAbout, SpectrumFormat, SpectrumProblem } from '../types/spectrum'
import { readSpectrum } from './read-spectrum'

/** What a list says of a spectrum, without its numbers. `name`: what a JSON spectrum calls itself. */
export interface SpectrumFacts {
  format: SpectrumFormat
  pixelCount: number
  /** First and last value of the axis, as in the file. */
  ends: [number, number]
  about: SpectrumAbout
  missing: MissingField[]
  warnings: string[]
  name: string | null
}
export type Description = { ok: true, facts: SpectrumFacts } | { ok: false, error: SpectrumProblem }

/** `fallback`: what the team says of the instrument; it fills what neither the person nor the file says. */
export interface Said { about: Partial<SpectrumAbout>, fallback?: Partial<SpectrumAbout> }

/** Reads bytes and keeps the facts: what the person says wins, then the file, then the fallback. */
export function describeSpectrum(bytes: Uint8Array, fileName: string, { about, fallback = {} }: Said): Description {
  const outcome = readSpectrum(bytes, fileName, about)
  if (!outcome.ok) return outcome
  const supplied = Object.fromEntries(outcome.missing.flatMap(field => fallback[field] == null ? [] : [[field, fallback[field]]]))
  if (Object.keys(supplied).length > 0) return describeSpectrum(bytes, fileName, { about: { ...about, ...supplied } })
  const { format, axis, warnings, name } = outcome.spectrum
  return { ok: true, facts: { format, pixelCount: axis.length, ends: [axis[0]!, axis.at(-1)!], about: outcome.about, missing: outcome.missing, warnings, name: name?.slice(0, 200) ?? null } }
}
