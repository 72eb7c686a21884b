import type { SpectrumAbout } from '../../types/spectrum'
import { implausibleTime } from '../../schemas/observation-time'
import { valueKindOf } from '../units'
import type { FitsHeader } from './header'
import { mildly, numberOf, textOf } from './header'

/** s, as in the schema of what a person says. */
const longestExposure = 1e7

/** What the header says about the observation; a date that cannot be read for sure is a warning, not a guess. */
export function readObservation(header: FitsHeader): { stated: Partial<SpectrumAbout>, warnings: string[] } {
  const warnings: string[] = []
  const stated = { ...statedExposure(header, warnings), ...statedValues(header, warnings), ...statedTime(header, warnings) }
  return { stated, warnings }
}

function statedExposure(header: FitsHeader, warnings: string[]): Partial<SpectrumAbout> {
  const exposure = mildly(() => numberOf(header, 'EXPTIME') ?? numberOf(header, 'EXPOSURE'), warnings)
  if (exposure === null) return {}
  if (exposure > 0 && exposure <= longestExposure) return { exposureSeconds: exposure }
  warnings.push(`The exposure of ${exposure} s was not taken; state how long the spectrum was exposed.`)
  return {}
}

function statedValues(header: FitsHeader, warnings: string[]): Partial<SpectrumAbout> {
  const unit = mildly(() => textOf(header, 'BUNIT'), warnings)
  const kind = unit && valueKindOf(unit)
  return { ...(unit ? { valueUnit: unit.slice(0, 64) } : {}), ...(kind ? { valueKind: kind } : {}) }
}

/** DATE-OBS, or DATE-BEG, with what the standard says of its scale. */
function statedTime(header: FitsHeader, warnings: string[]): Partial<SpectrumAbout> {
  const keyword = header.values.has('DATE-OBS') || !header.values.has('DATE-BEG') ? 'DATE-OBS' : 'DATE-BEG'
  const text = (name: string) => mildly(() => textOf(header, name), warnings)
  const [date, scale, clock, end] = [text(keyword), text('TIMESYS')?.toUpperCase() ?? 'UTC', text('TIME-OBS'), text('DATE-END')]
  if (!date) return {}
  const time = scale === 'UTC' ? timeOf(date, clock) : null
  const problem = time ? implausibleTime(time) ?? endProblem(time, end) : `${scale === 'UTC' ? '' : `with TIMESYS = "${scale}" `}was not read as a time in UTC.`
  if (time && !problem) return { observedAt: time.toISOString() }
  warnings.push(`${keyword} = "${date}" ${problem} State when the spectrum was taken.`)
  return {}
}

function endProblem(start: Date, end: string | null): string | null {
  const ended = end ? timeOf(end, null) : null
  return ended && ended < start ? `lies after DATE-END = "${end}", and was not taken.` : null
}

/** DATE-OBS is UTC unless TIMESYS says otherwise (FITS standard 4.0, section 9); the clock may stand in TIME-OBS. */
function timeOf(date: string, clock: string | null): Date | null {
  const full = date.includes('T') || !clock ? date : `${date}T${clock}`
  if (!/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d+)?Z?$/.test(full)) return null
  const time = new Date(full.endsWith('Z') ? full : `${full}Z`)
  // A day that the month does not have would roll over into the next.
  return Number.isNaN(time.getTime()) || time.getUTCDate() !== Number(full.slice(8, 10)) ? null : time
}
