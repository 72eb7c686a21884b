/** What of a request decides whether it may change something on the strength of a cookie. */
export interface CsrfFacts {
  method: string
  origin: string | undefined
  fetchSite: string | undefined
  host: string | undefined
  contentType: string | undefined
  hasBody: boolean
}

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS'])
const jsonOrMultipart = /^(application\/json|multipart\/form-data)\s*(;|$)/i

/**
 * A browser sends the cookie along whichever site made the request, so a change needs proof that our own page made it:
 * our Origin, or Sec-Fetch-Site same-origin. Forms of other sites can send neither JSON nor (checked) multipart.
 * @returns what is wrong, or null
 */
export function csrfProblem(facts: CsrfFacts, ownOrigin: string): 'cross_site_request' | 'unsupported_media_type' | null {
  if (safeMethods.has(facts.method)) return null
  if (!isOwnPage(facts, ownOrigin)) return 'cross_site_request'
  if (facts.hasBody && !jsonOrMultipart.test(facts.contentType ?? '')) return 'unsupported_media_type'
  return null
}

/** Whether a page of this address made the request. */
export function isOwnPage({ origin, fetchSite, host }: Pick<CsrfFacts, 'origin' | 'fetchSite' | 'host'>, ownOrigin: string): boolean {
  if (fetchSite !== undefined && fetchSite !== 'same-origin') return false
  if (origin === undefined) return fetchSite === 'same-origin'
  return origin === ownOrigin || hostOf(origin) === host
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host
  }
  catch {
    return null
  }
}
