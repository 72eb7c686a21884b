import { getHeader, type H3Event } from 'h3'
import { DomainError } from '#shared/utils/domain-error'
import { config } from '../config'

import { csrfProblem, isOwnPage, type CsrfFacts } from './csrf'

const factsOf = (event: H3Event): CsrfFacts => ({
  method: event.method,
  origin: getHeader(event, 'origin'),
  fetchSite: getHeader(event, 'sec-fetch-site'),
  host: getHeader(event, 'host'),
  contentType: getHeader(event, 'content-type'),
  hasBody: Number(getHeader(event, 'content-length') ?? 0) > 0 || getHeader(event, 'transfer-encoding') !== undefined,
})

/** Refuses a change that rests on a cookie and that another site may have caused. */
export function refuseCrossSite(event: H3Event): void {
  const problem = csrfProblem(factsOf(event), config().origin)
  if (problem === 'cross_site_request') throw new DomainError(problem, 'This change was not asked for by a page of this service. Scripts use an API token instead of the cookie.')
  if (problem) throw new DomainError(problem, 'Send the body as application/json or multipart/form-data.')
}

/** The sign-in forms carry their own token and are url-encoded; they still must come from our pages. */
export function refuseForeignPage(event: H3Event): void {
  if (event.method === 'POST' && !isOwnPage(factsOf(event), config().origin)) {
    throw new DomainError('cross_site_request', 'Signing in and out is done from the pages of this service.')
  }
}
