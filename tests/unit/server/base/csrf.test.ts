import { describe, expect, it } from 'vitest'
import { csrfProblem, type CsrfFacts } from '~~/server/utils/csrf'

const own = 'https://trotline.example.org'
const change: CsrfFacts = { method: 'POST', origin: own, fetchSite: 'same-origin', host: 'trotline.example.org', contentType: 'application/json', hasBody: true }
const problem = (facts: Partial<CsrfFacts>) => csrfProblem({ ...change, ...facts }, own)

describe('a change asked for with a cookie', () => {
  it('passes from a page of our own', () => {
    expect(problem({})).toBeNull()
    expect(problem({ contentType: 'multipart/form-data; boundary=x' })).toBeNull()
    expect(problem({ method: 'DELETE', hasBody: false, contentType: undefined })).toBeNull()
  })

  it('passes by its origin alone, as an older browser sends it', () => {
    expect(problem({ fetchSite: undefined })).toBeNull()
  })

  it('passes by Sec-Fetch-Site alone', () => {
    expect(problem({ origin: undefined })).toBeNull()
  })

  it('passes under the other loopback name that the visitor typed', () => {
    expect(csrfProblem({ ...change, origin: 'http://localhost:4310', host: 'localhost:4310' }, 'http://127.0.0.1:4310')).toBeNull()
  })

  it.each([
    ['another site', { origin: 'https://elsewhere.example', fetchSite: 'cross-site' }],
    ['a sibling domain', { origin: 'https://other.example.org', fetchSite: 'same-site' }],
    ['a sandboxed frame', { origin: 'null', fetchSite: undefined }],
    ['a request that tells neither', { origin: undefined, fetchSite: undefined }],
    ['a page that only claims our origin', { fetchSite: 'cross-site' }],
    ['another port of the same host', { origin: 'https://trotline.example.org:8443', fetchSite: undefined }],
  ])('is refused from %s', (_who, facts) => {
    expect(problem(facts)).toBe('cross_site_request')
  })

  it.each(['text/plain', 'application/x-www-form-urlencoded', undefined, 'application/jsonx'])('is refused with the content type %s, which a foreign form can send', (contentType) => {
    expect(problem({ contentType })).toBe('unsupported_media_type')
  })

  it('reading is never refused', () => {
    for (const method of ['GET', 'HEAD', 'OPTIONS']) expect(problem({ method, origin: 'https://elsewhere.example', fetchSite: 'cross-site' })).toBeNull()
  })
})
