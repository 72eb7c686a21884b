import { createError } from 'h3'
import { describe, expect, it } from 'vitest'
import { DomainError } from '#shared/utils/domain-error'
import { toErrorAnswer } from '~~/server/utils/error-answer'

const refused = Object.assign(new Error('connect ECONNREFUSED 127.0.0.1:3306'), { code: 'ECONNREFUSED' })

describe('an error becomes an answer', () => {
  it('a domain error keeps its code, message, fields and current row', () => {
    const error = new DomainError('stale_version', 'It moved on.', [{ path: 'a', message: 'b' }], { version: 4 })
    expect(toErrorAnswer(error, 'r1')).toEqual({
      status: 409, unexpected: false,
      body: { error: { code: 'stale_version', message: 'It moved on.', fields: [{ path: 'a', message: 'b' }], current: { version: 4 } } },
    })
  })

  it('a domain error is found inside the error that h3 wraps around it', () => {
    const wrapped = createError({ statusCode: 500, cause: new DomainError('not_found', 'No such thing.') })
    expect(toErrorAnswer(wrapped, 'r1')).toMatchObject({ status: 404, body: { error: { code: 'not_found', message: 'No such thing.' } } })
  })

  it('an unknown error tells nothing but the id of its request', () => {
    const { status, body, unexpected } = toErrorAnswer(new Error('SELECT secret FROM users'), 'r42')
    expect({ status, code: body.error.code, unexpected }).toEqual({ status: 500, code: 'internal', unexpected: true })
    expect(body.error.message).toContain('r42')
    expect(JSON.stringify(body)).not.toContain('SELECT')
  })

  it.each([
    ['the database refuses', new Error('query failed', { cause: refused })],
    ['every address refuses', Object.assign(new Error('all failed'), { errors: [refused, refused] })],
    ['the connection breaks', Object.assign(new Error('gone'), { code: 'PROTOCOL_CONNECTION_LOST' })],
  ])('when %s the service is said to be down, not broken', (_what, error) => {
    expect(toErrorAnswer(error, 'r1')).toMatchObject({ status: 503, body: { error: { code: 'dependency_down' } }, unexpected: true })
  })

  it('what our own API refused to a page that was being drawn is what the page answers', () => {
    const refusal = Object.assign(new Error('[GET] "/api/auth/session": 503'), { data: { error: { code: 'dependency_down', message: 'Not reachable.' } } })
    expect(toErrorAnswer(createError({ statusCode: 500, unhandled: true, cause: refusal }), 'r1')).toMatchObject({ status: 503, body: { error: { message: 'Not reachable.' } } })
  })

  it('the message of a framework error is ours, not the framework\'s', () => {
    const answer = toErrorAnswer(createError({ statusCode: 404, message: 'Cannot find any route matching /x' }), 'r1')
    expect(answer.body.error).toEqual({ code: 'not_found', message: 'There is nothing at this address.' })
  })

  it('an unhandled error with a borrowed status stays our fault', () => {
    expect(toErrorAnswer(createError({ statusCode: 404, unhandled: true }), 'r1').status).toBe(500)
  })
})
