import { FormatError } from '../format-error'
import { numberOf } from './header'
import type { FitsImage } from './find-image'

/** Physical values BZERO + BSCALE * stored; NaN where the file says undefined (BLANK, or NaN in a float image). */
export function readPixels(bytes: Uint8Array, image: FitsImage): Float64Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset + image.header.dataStart)
  const stored = storedReader(view, image.bitpix)
  const scale = numberOf(image.header, 'BSCALE') ?? 1
  if (scale === 0) throw new FormatError('fits_header', 'BSCALE = 0 makes every pixel the same. Mend the card; without scaling it is 1.', 'BSCALE')
  const zero = numberOf(image.header, 'BZERO') ?? 0
  const blank = image.bitpix > 0 ? numberOf(image.header, 'BLANK') : null
  const values = new Float64Array(image.length)
  for (let i = 0; i < image.length; i++) {
    const raw = stored(i)
    values[i] = raw === blank ? Number.NaN : zero + scale * raw
  }
  return values
}

/** Big-endian, as FITS stores everything; 8-bit is unsigned. */
function storedReader(view: DataView, bitpix: number): (index: number) => number {
  switch (bitpix) {
    case 8: return index => view.getUint8(index)
    case 16: return index => view.getInt16(2 * index)
    case 32: return index => view.getInt32(4 * index)
    case 64: return index => Number(view.getBigInt64(8 * index))
    case -32: return index => view.getFloat32(4 * index)
    default: return index => view.getFloat64(8 * index)
  }
}
