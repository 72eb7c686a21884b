import { FormatError } from '../format-error'

export type CardValue = string | number | boolean
export interface FitsHeader {
  values: Map<string, CardValue>
  comments: Map<string, string>
  /** Offset of the data that follow. */
  dataStart: number
}

const BLOCK = 2880
const CARD = 80

/** One header (FITS standard 4.0, section 4): 80-character cards up to END, filled to 2880 bytes. */
export function parseHeader(bytes: Uint8Array, start: number): FitsHeader {
  const header: FitsHeader = { values: new Map(), comments: new Map(), dataStart: 0 }
  for (let at = start; at + CARD <= bytes.length; at += CARD) {
    const card = asciiCard(bytes, at)
    const keyword = card.slice(0, 8).trimEnd()
    if (keyword === 'END') return { ...header, dataStart: start + Math.ceil((at + CARD - start) / BLOCK) * BLOCK }
    if (card.slice(8, 10) === '= ') addCard(header, keyword, card.slice(10))
  }
  throw new FormatError('fits_truncated', 'The FITS header has no END card: the file is cut off. Transfer it again (in binary mode).', 'header')
}

function asciiCard(bytes: Uint8Array, at: number): string {
  let card = ''
  for (let i = at; i < at + CARD; i++) card += String.fromCharCode(bytes[i]!)
  return card
}

function addCard(header: FitsHeader, keyword: string, field: string): void {
  const text = /^\s*'((?:[^']|'')*)'\s*(?:\/(.*))?$/.exec(field)
  const plain = /^\s*([^/\s]*)[^/]*(?:\/(.*))?$/.exec(field)
  const value = text ? text[1]!.replaceAll('\'\'', '\'').trimEnd() : plainValue(plain?.[1] ?? '')
  if (value !== null) header.values.set(keyword, value)
  const comment = (text ?? plain)?.[2]?.trim()
  if (comment) header.comments.set(keyword, comment)
}

function plainValue(word: string): CardValue | null {
  if (word === 'T' || word === 'F') return word === 'T'
  if (word === '') return null
  const number = Number(word.replace(/[dD]/, 'e'))
  return Number.isFinite(number) ? number : null
}

export function numberOf(header: FitsHeader, keyword: string): number | null {
  const value = header.values.get(keyword)
  return typeof value === 'number' ? value : null
}

export function textOf(header: FitsHeader, keyword: string): string | null {
  const value = header.values.get(keyword)
  return typeof value === 'string' && value.trim() ? value.trim() : null
}
