import * as z from 'zod'

/** Words reserved by the pages of the service: a thing of that name could not be opened. */
export const reservedSlugs = ['new', 'compare'] as const

/** The part of an address that names a thing. */
export const slugSchema = z.string().trim().min(1, 'Enter an address, for example hollow-ridge.').max(64, 'An address takes at most 64 characters.')
  .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use small letters, digits and single hyphens, for example hollow-ridge.')
  .refine(slug => !(reservedSlugs as readonly string[]).includes(slug), 'The pages of the service use this word themselves; choose another one.')

/** A slug as it stands in the path of a request. */
export const slugParam = z.string().min(1).max(64)

export const versionSchema = z.int().min(1, 'Send the version of the row that you changed.')

/** Control characters break lines where none is expected; direction marks and emoji are letters like any other. */
// eslint-disable-next-line no-control-regex
const controlCharacter = /[\u0000-\u001f\u007f]/

/** One line of text that must be there: a name, a title. */
export const lineOfText = (what: string, most: number) => z.string(`${what} is a text.`).trim()
  .min(1, `${what} is needed.`).max(most, `${what} takes at most ${most} characters.`)
  .refine(text => !controlCharacter.test(text), `${what} is one line, without control characters.`)

export const longText = (what: string) => z.string(`${what} is a text.`).trim().max(20_000, `${what} takes at most 20,000 characters.`)

/** A number within limits, with the limits in words. */
export const numberBetween = (low: number, high: number, words: string) => z.number('Enter a number, with a point for decimals.').min(low, words).max(high, words)

export const positiveNumber = (high: number, words: string) => z.number('Enter a number, with a point for decimals.').positive(words).max(high, words)

/** Slugs of what results and files name stay as they are; see docs/adr/0007. */
export const fixedSlug = (what: string) => z.never(`The address of ${what} stays as it is, because files, scripts and results name it. Change the name instead.`).optional()
