import type { JsonSpectrum } from '../../schemas/spectrum'
import { jsonSpectrumSchema } from '../../schemas/spectrum'
import type { SpectrumAbout } from '../../types/spectrum'
import { checkAxis, checkPixelCount, checkSigma } from '../check-columns'
import { FormatError } from '../format-error'
import type { FormatReading } from '../format-reading'
import { decodeText } from '../text-table/decode-text'

/** A spectrum from the JSON upload body. Throws `FormatError`. */
export function readJsonSpectrum(bytes: Uint8Array): FormatReading {
  const { text, warnings } = decodeText(bytes)
  const { name: _name, axis, values, sigma, ...about } = parseBody(text)
  checkPixelCount(axis.length)
  checkLength('values', values, axis)
  if (sigma) checkLength('sigma', sigma, axis)
  const spectrum = { format: 'json' as const, axis: Float64Array.from(axis), values: Float64Array.from(values), sigma: sigma ? Float64Array.from(sigma) : null, stated: statedOf(about), columnNames: [], warnings }
  const place = (row: number) => `item ${row}`
  checkAxis(spectrum.axis, place)
  if (spectrum.sigma) checkSigma(spectrum.sigma, place)
  return { spectrum, proposedColumns: null }
}

function parseBody(text: string): JsonSpectrum {
  const parsed = jsonSpectrumSchema.safeParse(parseJson(text))
  if (parsed.success) return parsed.data
  const issue = parsed.error.issues[0]!
  const where = issue.path.join('.')
  throw new FormatError('json_invalid', where ? `${where}: ${issue.message}` : issue.message, where || undefined)
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  }
  catch {
    const hint = /[^"\w](NaN|-?Infinity)[^"\w]/.test(text) ? ' JSON knows neither NaN nor Infinity: leave those pixels out.' : ''
    throw new FormatError('json_invalid', `The file starts like JSON but is not valid JSON.${hint}`)
  }
}

function checkLength(name: string, list: number[], axis: number[]): void {
  if (list.length !== axis.length) throw new FormatError('ragged_row', `${name} has ${list.length} numbers and axis has ${axis.length}; they must be equally many.`, name)
}

function statedOf(about: Omit<JsonSpectrum, 'name' | 'axis' | 'values' | 'sigma'>): Partial<SpectrumAbout> {
  return Object.fromEntries(Object.entries(about).filter(([, value]) => value !== null && value !== undefined))
}
