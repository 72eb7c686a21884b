import type * as z from 'zod'
import { DomainError } from '#shared/utils/domain-error'

/** A change is checked as a whole with what stays: rules between fields hold for the row, not for the request. */
export function refuseProblems(schema: z.ZodType, whole: unknown): void {
  const checked = schema.safeParse(whole)
  if (checked.success) return
  const fields = checked.error.issues.map(issue => ({ path: issue.path.join('.'), message: issue.message }))
  throw new DomainError('validation_failed', fields[0]!.message, fields)
}
