import type { MissingField, ReadSpectrum, SpectrumAbout, SpectrumProblem } from '../types/spectrum'
import { readFits } from './fits/read-fits'
import { FormatError } from './format-error'
import type { FormatReading } from './format-reading'
import { readJsonSpectrum } from './json-spectrum/read-json-spectrum'
import { hasNonPositiveEnd, mergeAbout, missingFields } from './merge-about'
import { readTextTable } from './text-table/read-text-table'
import { foreignFormat } from './foreign-format'
import { utf16Name } from './text-table/decode-text'

export type ReadOutcome
  = { ok: true, spectrum: ReadSpectrum, about: SpectrumAbout, missing: MissingField[] }
    | { ok: false, error: SpectrumProblem }

/**
 * Reads a spectrum from the bytes of a file, by their content: the extension means nothing. Never throws.
 * `about`: what the person says; it wins over what the file states, and what neither says is listed in `missing`.
 * For a wavenumber or frequency axis the medium is vacuum and is not asked.
 */
export function readSpectrum(bytes: Uint8Array, fileName: string, about: Partial<SpectrumAbout> = {}): ReadOutcome {
  try {
    const reading = readAny(bytes, about)
    const merged = mergeAbout(reading, about)
    if (hasNonPositiveEnd(reading.spectrum, merged)) throw new FormatError('axis_not_positive', `The axis in ${merged.axisUnit} reaches zero or below. Check the unit and the axis column.`)
    const spectrum = withValueWarnings(reading.spectrum)
    return { ok: true, spectrum, about: merged, missing: missingFields(merged, reading.proposedColumns === null) }
  }
  catch (error) {
    return { ok: false, error: failureOf(error, fileName) }
  }
}

/** Not refused here: an absorption spectrum may be negative throughout. */
function withValueWarnings(spectrum: ReadSpectrum): ReadSpectrum {
  if (spectrum.values.some(value => value > 0)) return spectrum
  const zero = spectrum.values.every(value => value === 0)
  return { ...spectrum, warnings: [...spectrum.warnings, `${zero ? 'All values are zero' : 'No value is above zero'}: is this the column of the intensities?`] }
}

function readAny(bytes: Uint8Array, about: Partial<SpectrumAbout>): FormatReading {
  if (bytes.length === 0) throw new FormatError('empty_file', 'The file is empty. Look whether the program that writes it had finished, and send it again.')
  if (startsWith(bytes, 'SIMPLE  =')) return readFits(bytes)
  const foreign = foreignFormat(bytes)
  if (foreign) throw new FormatError('unknown_format', `This is ${foreign}, which is not read. Send plain text (CSV), a 1-D FITS image or JSON.`)
  if (isJson(bytes)) return readJsonSpectrum(bytes)
  return readTextTable(bytes, about.columns)
}

const startsWith = (bytes: Uint8Array, text: string) => Array.from(text).every((char, index) => bytes[index] === char.charCodeAt(0))

/** An opening brace, behind a byte order mark and white space at most. */
function isJson(bytes: Uint8Array): boolean {
  const encoding = utf16Name(bytes) ?? 'utf-8'
  const start = new TextDecoder(encoding).decode(bytes.subarray(0, 512)).trimStart()
  return start.startsWith('{') || /^\[\s*[[{"\d-]/.test(start)
}

function failureOf(error: unknown, fileName: string): SpectrumProblem {
  if (error instanceof FormatError) return { code: error.code, message: error.message, ...(error.where ? { where: error.where } : {}) }
  return { code: 'unreadable', message: `${fileName} could not be read as a spectrum. Send plain text (CSV), a 1-D FITS image or JSON.` }
}
