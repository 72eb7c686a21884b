import type * as z from 'zod'
import type { FieldProblem } from '#shared/types/error-codes'

/** What a schema finds wrong, one entry a place. */
export function problemsOf(schema: z.ZodType, values: unknown): FieldProblem[] {
  const checked = schema.safeParse(values)
  if (checked.success) return []
  return checked.error.issues.map(issue => ({ path: issue.path.join('.'), message: issue.message }))
}

export const sameProblem = (a: FieldProblem, b: FieldProblem): boolean => a.path === b.path && a.message === b.message
