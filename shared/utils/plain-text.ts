/** Characters of a file's name that are kept. */
export const maxFileName = 200

// Control characters, line and paragraph separators, and the marks that turn the direction of the text around them
// (explicit embeddings, overrides and isolates; the plain marks LRM, RLM and ALM stay).
const controls = /[\p{Cc}\u2028\u2029\u202A-\u202E\u2066-\u2069]/u
const halves = /\p{Cs}/u

/** Why a text cannot stand in one line of a page, a table or a mail; null when it can. */
export function lineProblem(text: string): string | null {
  if (controls.test(text)) return 'Leave out line breaks, control characters and marks that turn the direction of text.'
  return halves.test(text) ? halfWords : null
}

/** The same for a text of several lines. */
export function textProblem(text: string): string | null {
  if (controls.test(text.replace(/[\n\r\t]/g, ''))) return 'Leave out control characters and marks that turn the direction of text.'
  return halves.test(text) ? halfWords : null
}

const halfWords = 'The text holds half of a character; type it again.'

export const withoutControls = (text: string): string => text.replace(new RegExp(controls, 'gu'), '').replace(new RegExp(halves, 'gu'), '\uFFFD')
