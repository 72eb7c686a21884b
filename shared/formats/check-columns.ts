import { FormatError } from './format-error'
import { maxPixels, minPixels } from './limits'

/** Says where a row (0-based) stands in the file, in words. */
export type RowPlace = (row: number) => string

export function checkPixelCount(count: number): void {
  if (count < minPixels) throw new FormatError('too_few_pixels', `A spectrum needs at least ${minPixels} pixels; this file has ${count}.`)
  if (count > maxPixels) throw tooManyPixels()
}

export function tooManyPixels(): FormatError {
  return new FormatError('too_many_pixels', `A spectrum takes at most ${maxPixels.toLocaleString('en')} pixels; this file has more. Cut it to the range of the lines, or bin it.`)
}

/** The first row that breaks a strictly ascending or descending order, or -1. */
export function firstUnorderedRow(axis: Float64Array): number {
  const sign = axis[1]! < axis[0]! ? -1 : 1
  for (let row = 1; row < axis.length; row++) if (!(sign * (axis[row]! - axis[row - 1]!) > 0)) return row
  return -1
}

export function checkAxis(axis: Float64Array, place: RowPlace): void {
  const row = firstUnorderedRow(axis)
  if (row < 0) return
  const [before, here] = [axis[row - 1]!, axis[row]!]
  const what = here === before ? `repeats the axis value ${here}` : `has the axis value ${here} after ${before}, against the order of the rows before`
  throw new FormatError('axis_not_monotonic', `${capital(place(row))} ${what}. The axis must rise or fall strictly from row to row: sort the rows, remove repeats, or say which column is the axis.`, place(row))
}

export function checkSigma(sigma: Float64Array, place: RowPlace): void {
  const row = firstBadSigma(sigma)
  if (row < 0) return
  throw new FormatError('sigma_not_positive', `${capital(place(row))} has sigma = ${sigma[row]}. Every sigma must be greater than zero: mend or remove the row, or say that the file has no sigma column.`, place(row))
}

export function firstBadSigma(sigma: Float64Array): number {
  return sigma.findIndex(value => !(value > 0))
}

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)
