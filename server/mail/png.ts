import { crc32 as zlibCrc32, deflateSync } from 'node:zlib'

export type Rgb = [red: number, green: number, blue: number]

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const framed = Buffer.alloc(body.length + 8)
  framed.writeUInt32BE(data.length, 0)
  body.copy(framed, 4)
  framed.writeUInt32BE(zlibCrc32(body), body.length + 4)
  return framed
}

/** An indexed PNG (one byte a pixel) from palette indices in rows; PNG specification (W3C, third edition), sections 5 and 11. */
export function encodePng({ width, height, pixels, palette }: { width: number, height: number, pixels: Uint8Array, palette: Rgb[] }): Buffer {
  const header = Buffer.alloc(13)
  header.writeUInt32BE(width, 0)
  header.writeUInt32BE(height, 4)
  header.set([8, 3, 0, 0, 0], 8)
  const rows = Buffer.alloc((width + 1) * height)
  for (let y = 0; y < height; y++) rows.set(pixels.subarray(y * width, (y + 1) * width), y * (width + 1) + 1)
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A]),
    chunk('IHDR', header),
    chunk('PLTE', Buffer.from(palette.flat())),
    chunk('IDAT', deflateSync(rows)),
    chunk('IEND', Buffer.alloc(0)),
  ])
}
