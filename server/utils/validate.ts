import type * as z from 'zod'
import { DomainError } from '#shared/utils/domain-error'
import type { FieldProblem } from '#shared/types/error-codes'

/** Parses input by its schema; what is wrong is told field by field. */
export function validate<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  const fields = parsed.error.issues.map(toFieldProblem)
  const more = fields.length > 1 ? ` (and ${fields.length - 1} more)` : ''
  throw new DomainError('validation_failed', `${fields[0]!.path ? `${fields[0]!.path}: ` : ''}${fields[0]!.message}${more}`, fields)
}

const toFieldProblem = (issue: z.core.$ZodIssue): FieldProblem => ({ path: issue.path.map(String).join('.'), message: issue.message })
