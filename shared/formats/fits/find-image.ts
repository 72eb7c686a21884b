import { tooManyPixels } from '../check-columns'
import { FormatError } from '../format-error'
import { maxPixels } from '../limits'
import type { FitsHeader } from './header'
import { numberOf, parseHeader, textOf } from './header'

export interface FitsImage {
  header: FitsHeader
  bitpix: number
  length: number
  /** 1-based number of the one axis that is longer than 1. */
  axisNumber: number
  /** The file goes on behind this image. */
  more: boolean
}

const bitpixValues = [8, 16, 32, 64, -32, -64]

/** The first image of the file: the primary one, or when that is empty the first IMAGE extension. */
export function findImage(bytes: Uint8Array): FitsImage {
  let start = 0
  let skipped = ''
  while (start + 80 <= bytes.length) {
    const header = parseHeader(bytes, start)
    const shape = shapeOf(header)
    const kind = start === 0 ? 'IMAGE' : textOf(header, 'XTENSION') ?? ''
    const end = header.dataStart + dataBytes(header, shape)
    if (kind === 'IMAGE' && shape.length > 0) return imageFrom(header, shape, bytes.length, end)
    if (kind !== 'IMAGE') skipped = kind
    start = Math.ceil(end / 2880) * 2880
  }
  const table = skipped ? ` It holds a ${skipped} extension; only images are read: export the spectrum as text or as a 1-D image.` : ' Export the spectrum as a 1-D image or as text.'
  throw new FormatError('fits_no_image', `The FITS file holds no image with data.${table}`)
}

function shapeOf(header: FitsHeader): number[] {
  const count = numberOf(header, 'NAXIS')
  if (count === null || !Number.isInteger(count) || count < 0 || count > 999) throw new FormatError('fits_header', 'The FITS header lacks a valid NAXIS. Write the file again with a program that follows the standard.', 'NAXIS')
  return Array.from({ length: count }, (_, index) => axisLength(header, `NAXIS${index + 1}`))
}

function axisLength(header: FitsHeader, keyword: string): number {
  const length = numberOf(header, keyword)
  if (length === null || !Number.isInteger(length) || length < 0) throw new FormatError('fits_header', `The FITS header lacks a valid ${keyword}. Write the file again with a program that follows the standard.`, keyword)
  return length
}

/** Size of the data (equation 2 of the standard). */
function dataBytes(header: FitsHeader, shape: number[]): number {
  if (shape.length === 0) return 0
  const elements = shape.reduce((product, length) => product * length, 1)
  const size = Math.abs(bitpixOf(header)) / 8 * countOf(header, 'GCOUNT', 1) * (countOf(header, 'PCOUNT', 0) + elements)
  if (!Number.isSafeInteger(size)) throw new FormatError('fits_header', `The FITS header asks for an image of ${shape.join(' x ')}, which no file can hold. Write the file again with a program that follows the standard.`, 'NAXIS')
  return size
}

/** A negative count would lead backwards through the file. */
function countOf(header: FitsHeader, keyword: 'GCOUNT' | 'PCOUNT', fallback: number): number {
  const count = numberOf(header, keyword) ?? fallback
  if (!Number.isInteger(count) || count < fallback) throw new FormatError('fits_header', `${keyword} = ${count} is not valid in a FITS header. Write the file again with a program that follows the standard.`, keyword)
  return count
}

function bitpixOf(header: FitsHeader): number {
  const bitpix = numberOf(header, 'BITPIX')
  if (bitpix === null || !bitpixValues.includes(bitpix)) throw new FormatError('fits_header', `The FITS header lacks a valid BITPIX (one of ${bitpixValues.join(', ')}).`, 'BITPIX')
  return bitpix
}

function imageFrom(header: FitsHeader, shape: number[], fileBytes: number, end: number): FitsImage {
  const long = shape.flatMap((length, index) => length > 1 ? [index + 1] : [])
  if (long.length > 1) throw new FormatError('fits_not_one_dimensional', `The FITS image has ${long.length} dimensions (${shape.join(' x ')}). Extract a one-dimensional spectrum first.`, 'NAXIS')
  const axisNumber = long[0] ?? 1
  const length = shape[axisNumber - 1]!
  if (length > maxPixels) throw tooManyPixels()
  if (end > fileBytes) throw new FormatError('fits_truncated', `The FITS file is cut off: the image needs ${end} bytes and the file has ${fileBytes}. Transfer it again (in binary mode).`, 'data')
  return { header, bitpix: bitpixOf(header), length, axisNumber, more: Math.ceil(end / 2880) * 2880 + 80 <= fileBytes }
}
