/** Every code an answer can carry, with its HTTP status. A code names the situation; the message says how to mend it. */
export const errorStatus = {
  bad_request: 400,
  malformed_upload: 400,
  unauthenticated: 401,
  invalid_credentials: 401,
  token_expired: 401,
  forbidden: 403,
  insufficient_scope: 403,
  cross_site_request: 403,
  not_found: 404,
  method_not_allowed: 405,
  conflict: 409,
  stale_version: 409,
  idempotency_mismatch: 409,
  already_finished: 409,
  wrong_phase: 409,
  payload_too_large: 413,
  unsupported_media_type: 415,
  validation_failed: 422,
  unreadable_spectrum: 422,
  incomplete_spectrum: 422,
  unknown_line: 422,
  unknown_line_list: 422,
  too_many: 422,
  rate_limited: 429,
  internal: 500,
  dependency_down: 503,
  storage_full: 503,
} as const
export type ErrorCode = keyof typeof errorStatus
export interface FieldProblem { path: string, message: string }
export interface ErrorBody { error: { code: ErrorCode, message: string, fields?: FieldProblem[], current?: unknown } }
