import { execFileSync } from 'node:child_process'
import { inflateSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { retrieveFromLines } from '#shared/engine/retrieve/from-lines'
import { envelopePicture } from '../../../../server/mail/envelope-picture'
import { encodePng } from '../../../../server/mail/png'
import { syntheticInput } from '../../engine/helpers/tables'

const lines = retrieveFromLines(syntheticInput({ temperature: 190 })).lines

function chunksOf(png: Buffer): Map<string, Buffer> {
  const chunks = new Map<string, Buffer>()
  for (let at = 8; at < png.length;) {
    const length = png.readUInt32BE(at)
    chunks.set(png.toString('latin1', at + 4, at + 8), png.subarray(at + 8, at + 8 + length))
    at += 12 + length
  }
  return chunks
}

/** Height of the stroke in the column of each line, in pixels of the strokes' colours. */
function columnInk(png: Buffer, count: number): number[] {
  const rows = inflateSync(chunksOf(png).get('IDAT')!)
  return Array.from({ length: count }, (_, i) => {
    const x = Math.round(12 + (i + 0.5) * (520 - 24) / count)
    return Array.from({ length: 168 }, (__, y) => rows[y * 521 + 1 + x]!).filter(colour => colour >= 2).length
  })
}

describe('the picture in a mail', () => {
  it('is a PNG that another program reads, with its checksums', () => {
    const script = 'import sys, zlib, struct\nd = sys.stdin.buffer.read()\nassert d[:8] == b"\\x89PNG\\r\\n\\x1a\\n"\nat, raw, names = 8, b"", []\n'
      + 'while at < len(d):\n n, = struct.unpack(">I", d[at:at+4]); kind = d[at+4:at+8]; body = d[at+8:at+8+n]\n assert struct.unpack(">I", d[at+8+n:at+12+n])[0] == zlib.crc32(kind + body)\n'
      + ' names.append(kind.decode()); raw += body if kind == b"IDAT" else b""; at += 12 + n\nprint(",".join(names), len(zlib.decompress(raw)))'
    const answer = execFileSync('/usr/bin/python3', ['-c', script], { input: envelopePicture(lines)!, encoding: 'utf8' })
    expect(answer.trim()).toBe(`IHDR,PLTE,IDAT,IEND ${521 * 168}`)
  })

  it('draws a stronger line longer', () => {
    const sorted = [...lines].sort((a, b) => a.termEnergy - b.termEnergy)
    const ink = columnInk(envelopePicture(lines)!, sorted.length)
    const byIntensity = sorted.map((line, i) => ({ intensity: line.intensity, ink: ink[i]! })).sort((a, b) => a.intensity - b.intensity)
    expect(byIntensity.map(({ ink: length }) => length)).toEqual(byIntensity.map(({ ink: length }) => length).toSorted((a, b) => a - b))
    expect(byIntensity.at(-1)!.ink).toBeGreaterThan(2 * byIntensity[0]!.ink)
  })

  it('is left out where there is nothing to draw', () => {
    expect(envelopePicture([])).toBeNull()
    expect(envelopePicture(lines.map(line => ({ ...line, intensity: -1, model: null })))).toBeNull()
  })

  it('takes negative intensities and many lines without leaving its frame', () => {
    const many = Array.from({ length: 500 }, (_, i) => ({ ...lines[i % lines.length]!, termEnergy: i, intensity: i % 7 - 3, model: i % 5 - 2 }))
    expect(inflateSync(chunksOf(envelopePicture(many)!).get('IDAT')!)).toHaveLength(521 * 168)
  })

  it('keeps the pixels and the palette as given', () => {
    const png = encodePng({ width: 3, height: 2, pixels: Uint8Array.from([0, 1, 0, 1, 1, 0]), palette: [[1, 2, 3], [4, 5, 6]] })
    const chunks = chunksOf(png)
    expect([...chunks.get('PLTE')!]).toEqual([1, 2, 3, 4, 5, 6])
    expect([...inflateSync(chunks.get('IDAT')!)]).toEqual([0, 0, 1, 0, 0, 1, 1, 0])
  })
})
