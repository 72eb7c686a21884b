import type { MissingField, ReadSpectrum, SpectrumAbout } from '../types/spectrum'
import type { FormatReading } from './format-reading'
import { impliesVacuum } from './units'

export const nothingSaid: SpectrumAbout = {
  axisUnit: null, medium: null, airFormula: 'ciddor1996', valueKind: null, valueUnit: null, columns: null,
  observedAt: null, exposureSeconds: null, station: null, instrument: null, fullScale: null,
}

/** What the person says wins; else what the file states. A null or absent answer says nothing. */
export function mergeAbout(reading: FormatReading, said: Partial<SpectrumAbout>): SpectrumAbout {
  const about = { ...nothingSaid, columns: reading.proposedColumns, ...spoken(reading.spectrum.stated), ...spoken(said) }
  if (about.medium === null && impliesVacuum(about.axisUnit)) about.medium = 'vacuum'
  if (reading.spectrum.format !== 'text') about.columns = null
  return about
}

function spoken(about: Partial<SpectrumAbout>): Partial<SpectrumAbout> {
  return Object.fromEntries(Object.entries(about).filter(([, value]) => value !== null && value !== undefined))
}

/** What must still be asked. A pixel axis has no medium. */
export function missingFields(about: SpectrumAbout, columnsConfirmed: boolean): MissingField[] {
  const missing: MissingField[] = []
  if (!columnsConfirmed) missing.push('columns')
  if (about.axisUnit === null) missing.push('axisUnit')
  if (about.medium === null && about.axisUnit !== 'pixel') missing.push('medium')
  if (about.valueKind === null) missing.push('valueKind')
  return missing
}

/** A wavelength, wavenumber or frequency is positive; the ends of an ordered axis tell. */
export function hasNonPositiveEnd(spectrum: ReadSpectrum, about: SpectrumAbout): boolean {
  if (about.axisUnit === null || about.axisUnit === 'pixel') return false
  return Math.min(spectrum.axis[0]!, spectrum.axis.at(-1)!) <= 0
}
