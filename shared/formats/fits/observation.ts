import type { SpectrumAbout } from '../../types/spectrum'
import { valueKindOf } from '../units'
import type { FitsHeader } from './header'
import { numberOf, textOf } from './header'

/** What the header says about the observation; a date that cannot be read for sure is a warning, not a guess. */
export function readObservation(header: FitsHeader): { stated: Partial<SpectrumAbout>, warnings: string[] } {
  const stated: Partial<SpectrumAbout> = {}
  const warnings: string[] = []
  const exposure = numberOf(header, 'EXPTIME') ?? numberOf(header, 'EXPOSURE')
  if (exposure !== null && exposure > 0) stated.exposureSeconds = exposure
  const unit = textOf(header, 'BUNIT')
  if (unit) {
    stated.valueUnit = unit
    const kind = valueKindOf(unit)
    if (kind) stated.valueKind = kind
  }
  const date = textOf(header, 'DATE-OBS')
  const observedAt = date ? timeOf(header, date) : null
  if (observedAt) stated.observedAt = observedAt
  else if (date) warnings.push(`DATE-OBS = "${date}"${scaleNote(header)} was not read as a time in UTC; state when the spectrum was taken.`)
  return { stated, warnings }
}

const timeScale = (header: FitsHeader) => (textOf(header, 'TIMESYS') ?? 'UTC').toUpperCase()
const scaleNote = (header: FitsHeader) => timeScale(header) === 'UTC' ? '' : ` with TIMESYS = "${timeScale(header)}"`

/** DATE-OBS is UTC unless TIMESYS says otherwise (FITS standard 4.0, section 9); the clock may stand in TIME-OBS. */
function timeOf(header: FitsHeader, date: string): string | null {
  if (timeScale(header) !== 'UTC') return null
  const clock = textOf(header, 'TIME-OBS')
  const full = date.includes('T') || !clock ? date : `${date}T${clock}`
  if (!/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d+)?Z?$/.test(full)) return null
  const time = new Date(full.endsWith('Z') ? full : `${full}Z`)
  return Number.isNaN(time.getTime()) ? null : time.toISOString()
}
