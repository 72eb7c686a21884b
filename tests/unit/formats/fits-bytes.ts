/** A FITS image made by hand: cards as given, data as given, both filled to blocks of 2880 bytes. */
export function fitsBytes(cards: Record<string, string | number | boolean>, data: Uint8Array, extension = false): Uint8Array {
  const start: [string, string | number | boolean] = extension ? ['XTENSION', cards.XTENSION ?? 'IMAGE'] : ['SIMPLE', true]
  const lines = [start, ...Object.entries(cards).filter(([key]) => key !== 'XTENSION')].map(([key, value]) => card(key, value))
  const header = [...lines, 'END'.padEnd(80)].join('')
  const head = Uint8Array.from(header.padEnd(Math.ceil(header.length / 2880) * 2880), char => char.charCodeAt(0))
  const body = new Uint8Array(Math.ceil(data.length / 2880) * 2880)
  body.set(data)
  return Uint8Array.from([...head, ...body])
}

const card = (key: string, value: string | number | boolean) =>
  `${key.padEnd(8)}= ${typeof value === 'string' ? `'${value.padEnd(8)}'` : String(typeof value === 'boolean' ? (value ? 'T' : 'F') : value).padStart(20)}`.padEnd(80)

export function floats(values: number[]): Uint8Array {
  const view = new DataView(new ArrayBuffer(8 * values.length))
  values.forEach((value, index) => view.setFloat64(8 * index, value))
  return new Uint8Array(view.buffer)
}

export const linear = { BITPIX: -64, NAXIS: 1, NAXIS1: 3, CRPIX1: 1, CRVAL1: 500, CDELT1: 0.5 }
export const linearImage = (cards: Record<string, string | number | boolean> = {}, values = [1, 2, 3]) => fitsBytes({ ...linear, ...cards }, floats(values))
