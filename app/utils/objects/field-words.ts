/** A field of something that is edited: where it stands, how it is called, and its value in words. */
export interface FieldWords {
  path: string
  label: string
  words: (value: unknown) => string
}

export const notStated = 'not stated'

const isNothing = (value: unknown) => value === null || value === undefined || value === ''

/** A field of free text; `nothing` is what an empty one means. */
export const text = (path: string, label: string, nothing = notStated): FieldWords =>
  ({ path, label, words: value => isNothing(value) ? nothing : String(value) })

/** A number with its unit. */
export const quantity = (path: string, label: string, unit: string, nothing = notStated): FieldWords =>
  ({ path, label, words: value => isNothing(value) ? nothing : `${String(value).replace('-', '−')}${unit && ` ${unit}`}` })

/** One of some words. */
export const choice = (path: string, label: string, words: Record<string, string>, nothing = notStated): FieldWords =>
  ({ path, label, words: value => isNothing(value) ? nothing : words[String(value)] ?? String(value) })

/** A list; `nothing` is what an empty one means. */
export const list = (path: string, label: string, nothing: string): FieldWords =>
  ({ path, label, words: value => Array.isArray(value) && value.length > 0 ? value.join(', ') : nothing })
