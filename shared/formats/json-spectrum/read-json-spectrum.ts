import type { JsonSpectrum } from '../../schemas/spectrum'
import { jsonSpectrumSchema } from '../../schemas/spectrum'
import type { SpectrumAbout } from '../../types/spectrum'
import { checkAxis, checkPixelCount, checkSigma } from '../check-columns'
import { FormatError } from '../format-error'
import type { FormatReading } from '../format-reading'
import { JsonProblem, parseStrictJson } from '../strict-json'
import { decodeText } from '../text-table/decode-text'

/** A spectrum from the JSON upload body. Throws `FormatError`. */
export function readJsonSpectrum(bytes: Uint8Array): FormatReading {
  const { text, warnings } = decodeText(bytes)
  const { name, axis, values, sigma, ...about } = parseBody(text)
  checkPixelCount(axis.length)
  checkLength('values', values, axis)
  if (sigma) checkLength('sigma', sigma, axis)
  const spectrum = { format: 'json' as const, name, axis: Float64Array.from(axis), values: Float64Array.from(values), sigma: sigma ? Float64Array.from(sigma) : null, stated: statedOf(about), columnNames: [], warnings }
  const place = (row: number) => `item ${row}`
  checkAxis(spectrum.axis, place)
  if (spectrum.sigma) checkSigma(spectrum.sigma, place)
  return { spectrum, proposedColumns: null }
}

function parseBody(text: string): JsonSpectrum {
  const body = parseJson(text)
  if (typeof body !== 'object' || body === null || Array.isArray(body)) throw new FormatError('json_invalid', 'A JSON spectrum is an object such as {"name": "night 12", "axis": [1500.1, 1500.2], "values": [3.1, 3.4], "axisUnit": "nm"}.')
  const parsed = jsonSpectrumSchema.safeParse(body)
  if (parsed.success) return parsed.data
  const issue = parsed.error.issues[0]!
  const where = issue.path.join('.')
  const message = issue.message.length > 300 ? `${issue.message.slice(0, 300)} ...` : issue.message
  throw new FormatError('json_invalid', where ? `${where}: ${message}` : message, where || undefined)
}

function parseJson(text: string): unknown {
  try {
    return parseStrictJson(text)
  }
  catch (error) {
    if (!(error instanceof JsonProblem)) throw error
    throw new FormatError('json_syntax', error.path ? `${error.path}: ${error.message}` : `The file starts like JSON but is not valid JSON: ${error.message}`, error.path)
  }
}

function checkLength(name: string, list: number[], axis: number[]): void {
  if (list.length !== axis.length) throw new FormatError('ragged_row', `${name} has ${list.length} numbers and axis has ${axis.length}; they must be equally many.`, name)
}

function statedOf(about: Omit<JsonSpectrum, 'name' | 'axis' | 'values' | 'sigma'>): Partial<SpectrumAbout> {
  return Object.fromEntries(Object.entries(about).filter(([, value]) => value !== null && value !== undefined))
}
