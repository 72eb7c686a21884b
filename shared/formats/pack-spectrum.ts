import type { ReadSpectrum } from '../types/spectrum'

export type PackedColumns = Pick<ReadSpectrum, 'axis' | 'values' | 'sigma'>

const MAGIC = 0x54524C31 // "TRL1"
const HEAD = 16

/**
 * Columns as bytes for storage: a head of 16 bytes (magic, number of columns, number of pixels, zero; big-endian),
 * then axis, values and, if known, sigma as little-endian doubles. Compressing is the caller's.
 */
export function packSpectrum({ axis, values, sigma }: PackedColumns): Uint8Array<ArrayBuffer> {
  const columns = sigma ? [axis, values, sigma] : [axis, values]
  if (columns.some(column => column.length !== axis.length)) throw new RangeError('Axis, values and sigma differ in length.')
  const packed = new Uint8Array(HEAD + columns.length * axis.length * 8)
  const view = new DataView(packed.buffer)
  view.setUint32(0, MAGIC)
  view.setUint32(4, columns.length)
  view.setUint32(8, axis.length)
  columns.forEach((column, index) => column.forEach((value, row) => view.setFloat64(HEAD + (index * axis.length + row) * 8, value, true)))
  return packed
}

/** The reverse of `packSpectrum`; throws a RangeError for other bytes. */
export function unpackSpectrum(packed: Uint8Array): PackedColumns {
  const view = new DataView(packed.buffer, packed.byteOffset, packed.byteLength)
  const [magic, count, length] = packed.byteLength >= HEAD ? [view.getUint32(0), view.getUint32(4), view.getUint32(8)] : [0, 0, 0]
  if (magic !== MAGIC || (count !== 2 && count !== 3) || packed.byteLength !== HEAD + count * length * 8) throw new RangeError('These bytes are not a packed spectrum.')
  const column = (index: number) => Float64Array.from({ length }, (_, row) => view.getFloat64(HEAD + (index * length + row) * 8, true))
  return { axis: column(0), values: column(1), sigma: count === 3 ? column(2) : null }
}
