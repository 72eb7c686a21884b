import type { ErrorCode, FieldProblem } from '../types/error-codes'

/** What a service throws: it knows no HTTP; the error handler maps the code to a status. */
export class DomainError extends Error {
  constructor(
    public readonly code: ErrorCode,
    message: string,
    public readonly fields?: FieldProblem[],
    /** The row as it stands now, for `stale_version`. */
    public readonly current?: unknown,
  ) {
    super(message)
    this.name = 'DomainError'
  }
}
