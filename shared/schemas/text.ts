import * as z from 'zod'
import { lineProblem, textProblem } from '../utils/plain-text'

const atMost = (what: string, length: number) => ({
  error: ({ input }: { input?: unknown }) => `${what} takes at most ${length} characters; this one has ${String(input).length}.`,
})
const check = (problemOf: (text: string) => string | null) => (text: string, context: z.core.$RefinementCtx<string>) => {
  const problem = problemOf(text)
  if (problem) context.addIssue({ code: 'custom', message: problem })
}

/** A text of one line, such as a name: safe in a page, a table and the subject of a mail. `what`: "A name". */
export const lineSchema = (what: string, length: number, empty = `${what} cannot be empty.`) =>
  z.string().trim().min(1, empty).max(length, atMost(what, length)).superRefine(check(lineProblem))

/** A text of several lines; may be empty. */
export const textSchema = (what: string, length: number) => z.string().trim().max(length, atMost(what, length)).superRefine(check(textProblem))
