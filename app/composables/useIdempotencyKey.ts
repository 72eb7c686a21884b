/** One key for one request body: a retry of the same submission is the same submission, a changed one is new. */
export function useIdempotencyKey() {
  let body = ''
  let key = ''
  return (next: unknown): string => {
    const text = JSON.stringify(next)
    if (text !== body || !key) {
      body = text
      key = [...crypto.getRandomValues(new Uint8Array(16))].map(byte => byte.toString(16).padStart(2, '0')).join('')
    }
    return key
  }
}
