import { FormatError } from '../format-error'
import type { CardValue } from './card'
import { readCard } from './card'

export interface FitsHeader {
  values: Map<string, CardValue>
  comments: Map<string, string>
  /** Why a card cannot be relied on; told when its value is needed. */
  doubts: Map<string, string>
  /** Offset of the data that follow. */
  dataStart: number
}

const BLOCK = 2880
const CARD = 80
/** A thousand blocks; real headers have a few. */
const maxCards = 36_000

/** One header (FITS standard 4.0, section 4): 80-character cards up to END, filled to 2880 bytes. */
export function parseHeader(bytes: Uint8Array, start: number): FitsHeader {
  const header: FitsHeader = { values: new Map(), comments: new Map(), doubts: new Map(), dataStart: 0 }
  for (let at = start, count = 0; at + CARD <= bytes.length; at += CARD, count++) {
    if (count === maxCards) throw new FormatError('fits_header', `The FITS header has no END card among its first ${maxCards} cards. Write the file again with a program that follows the standard.`, 'header')
    const card = asciiCard(bytes, at)
    if (card.startsWith('END') && card.slice(3, 8).trim() === '') return { ...header, dataStart: start + Math.ceil((at + CARD - start) / BLOCK) * BLOCK }
    addCard(header, card)
  }
  throw new FormatError('fits_truncated', 'The FITS header has no END card: the file is cut off. Transfer it again (in binary mode).', 'header')
}

function asciiCard(bytes: Uint8Array, at: number): string {
  let card = ''
  for (let i = at; i < at + CARD; i++) card += String.fromCharCode(bytes[i]!)
  return card
}

function addCard({ values, comments, doubts }: FitsHeader, text: string): void {
  const card = readCard(text)
  if (!card) return
  const { keyword, comment } = card
  if ('doubt' in card) return void doubts.set(keyword, card.doubt)
  const earlier = values.get(keyword)
  if (card.value === null) return
  if (earlier !== undefined && earlier !== card.value) doubts.set(keyword, `stands there twice with different values (${earlier} and ${card.value})`)
  values.set(keyword, card.value)
  if (comment) comments.set(keyword, comment)
}

/** The card's number, null where there is none. A card that is there and says something else is refused: what it scales would be wrong. */
export function numberOf(header: FitsHeader, keyword: string): number | null {
  const value = reliable(header, keyword)
  if (value === undefined || typeof value === 'number') return value ?? null
  throw doubtful(keyword, `= ${typeof value === 'string' ? `'${value}'` : value ? 'T' : 'F'} is not a number`)
}

export function textOf(header: FitsHeader, keyword: string): string | null {
  const value = reliable(header, keyword)
  return typeof value === 'string' && value.trim() ? value.trim() : null
}

function reliable({ values, doubts }: FitsHeader, keyword: string): CardValue | undefined {
  const doubt = doubts.get(keyword)
  if (doubt) throw doubtful(keyword, doubt)
  return values.get(keyword)
}

const doubtful = (keyword: string, doubt: string) => new FormatError('fits_header', `The FITS card ${keyword} ${doubt}. Mend the card, or export axis and values as text.`, keyword)

/** For what only describes the spectrum: instead of refusing the file, the doubt goes into `warnings`. */
export function mildly<T>(read: () => T | null, warnings: string[]): T | null {
  try {
    return read()
  }
  catch (error) {
    if (!(error instanceof FormatError)) throw error
    warnings.push(`${error.message.split('. ')[0]}; it was not used.`)
    return null
  }
}
