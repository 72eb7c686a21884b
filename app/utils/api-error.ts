import type { ErrorCode, FieldProblem } from '#shared/types/error-codes'

/** What went wrong with a call, in the words of the server: `message` says what is wrong and how to mend it. */
export class ApiError extends Error {
  constructor(
    public readonly code: ErrorCode | 'unreachable',
    message: string,
    public readonly statusCode: number,
    public readonly fields: FieldProblem[] = [],
    public readonly current?: unknown,
  ) {
    super(message)
    this.name = 'ApiError'
  }

  /** Survives the way from server to browser: Nuxt keeps `data` of an error. */
  get data() { return { code: this.code, fields: this.fields, current: this.current } }

  /** The first message for a field path, for a form. */
  fieldMessage(path: string): string | undefined {
    return this.fields.find(field => field.path === path)?.message
  }
}

const record = (value: unknown): Record<string, unknown> => typeof value === 'object' && value !== null ? value as Record<string, unknown> : {}

/** Reads any thrown value (fetch error, Nuxt error, ApiError) into an ApiError. */
export function toApiError(thrown: unknown): ApiError {
  if (thrown instanceof ApiError) return thrown
  const outer = record(thrown)
  const status = Number(outer.statusCode ?? outer.status ?? 0) || 0
  const data = record(outer.data)
  const body = record(data.error)
  const said = typeof body.code === 'string' ? body : typeof data.code === 'string' ? { ...data, message: outer.message } : null
  if (said) {
    return new ApiError(said.code as ErrorCode, String(said.message ?? 'The request failed.'), status, Array.isArray(said.fields) ? said.fields as FieldProblem[] : [], said.current)
  }
  if (status) return new ApiError('internal', `The server answered ${status} without saying why. Try again; if it stays, tell the administrator.`, status)
  return new ApiError('unreachable', 'The server could not be reached. Check the connection and try again.', 0)
}
