import type * as z from 'zod'
import { DomainError } from '#shared/utils/domain-error'
import type { FieldProblem } from '#shared/types/error-codes'

const shownFields = 100
const longestMessage = 300

/** Parses input by its schema; what is wrong is told field by field. `within`: where the input stood, for the paths. */
export function validate<S extends z.ZodType>(schema: S, input: unknown, within?: string): z.output<S> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  const { issues } = parsed.error
  const fields = issues.slice(0, shownFields).map(issue => toFieldProblem(issue, within))
  const more = issues.length > 1 ? ` (and ${issues.length - 1} more)` : ''
  throw new DomainError('validation_failed', `${fields[0]!.path ? `${fields[0]!.path}: ` : ''}${fields[0]!.message}${more}`, fields)
}

const toFieldProblem = ({ path, message }: z.core.$ZodIssue, within: string | undefined): FieldProblem =>
  ({ path: cut([...(within ? [within] : []), ...path.map(String)].join('.'), 200), message: cut(message, longestMessage) })

/** What was sent comes back in messages; a long one is cut. */
const cut = (text: string, length: number) => text.length > length ? `${text.slice(0, length).toWellFormed()} ...` : text
