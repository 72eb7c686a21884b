export type CardValue = string | number | boolean
/** One 80-character card: what it says, or why it cannot be read. `value` null: the keyword stands there without a value, as the standard allows. */
export type Card = { keyword: string, comment: string } & ({ value: CardValue | null } | { doubt: string })

const standard = /^([A-Z0-9_-]{1,8}) *$/
const misplaced = /^([A-Za-z0-9_-]{1,8})\s*=\s*\S/
const quoted = /^\s*'((?:[^']|'')*)'\s*(?:\/(.*))?$/

/** A card with a value; null for a comment, a blank card and whatever else carries none. */
export function readCard(card: string): Card | null {
  const keyword = card.slice(0, 8)
  if (card.slice(8, 10) === '= ' && standard.test(keyword)) return { keyword: keyword.trimEnd(), ...readValue(card.slice(10)) }
  const [, meant] = misplaced.exec(card) ?? []
  if (!meant || /^(COMMENT|HISTORY)$/.test(meant)) return null
  return { keyword: meant.toUpperCase(), comment: '', doubt: 'is not written as "KEYWORD = value" with the equals sign in column 9 and a space behind it' }
}

function readValue(field: string): { comment: string } & ({ value: CardValue | null } | { doubt: string }) {
  const text = quoted.exec(field)
  if (text) return { value: text[1]!.replaceAll('\'\'', '\'').trimEnd(), comment: text[2]?.trim() ?? '' }
  if (field.trimStart().startsWith('\'')) return { comment: '', doubt: `has a text without its closing quote (${field.trim().slice(0, 40)})` }
  const slash = field.indexOf('/')
  const word = (slash < 0 ? field : field.slice(0, slash)).trim()
  const comment = slash < 0 ? '' : field.slice(slash + 1).trim()
  if (word === '') return { value: null, comment }
  if (word === 'T' || word === 'F') return { value: word === 'T', comment }
  const number = /^[+-]?(\d+\.?\d*|\.\d+)([EeDd][+-]?\d+)?$/.test(word) ? Number(word.replace(/[dD]/, 'e')) : Number.NaN
  return Number.isFinite(number) ? { value: number, comment } : { comment, doubt: `= ${word.slice(0, 40)} is neither a number nor a text in quotes` }
}
