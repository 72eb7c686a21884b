/** Where to go after signing in: a path of ours, never another site's address. */
export function safePath(wanted: unknown, ownOrigin: string): string {
  const text = Array.isArray(wanted) ? wanted[0] : wanted
  if (typeof text !== 'string' || text === '') return '/'
  try {
    const url = new URL(text, ownOrigin)
    if (url.origin !== new URL(ownOrigin).origin || url.pathname.startsWith('/sign-in')) return '/'
    return `${url.pathname}${url.search}${url.hash}`
  }
  catch {
    return '/'
  }
}
