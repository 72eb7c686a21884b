/** Did this statement lose against a unique key? drizzle wraps the driver's error, which carries the code. */
export function isDuplicateEntry(error: unknown): boolean {
  for (let cause = error, depth = 0; cause instanceof Error && depth < 5; cause = cause.cause, depth++) {
    if ('code' in cause && cause.code === 'ER_DUP_ENTRY') return true
  }
  return false
}
