import { describe, expect, it } from 'vitest'
import { pagePolicy, securityHeaders, withNonce } from '~~/server/utils/security-headers'

describe('the content security policy of a page', () => {
  it('lets no inline script run without the nonce', () => {
    const script = pagePolicy('abc', false).split('; ').find(directive => directive.startsWith('script-src'))
    expect(script).toBe('script-src \'self\' \'nonce-abc\'')
  })

  it('is loosened for styles in development only', () => {
    expect(pagePolicy('abc', false)).not.toMatch(/style-src [^;]*unsafe-inline/)
    expect(pagePolicy('abc', true)).toMatch(/style-src 'self' 'unsafe-inline'/)
  })
})

describe('the nonce', () => {
  it('is given to scripts, styles and links that have none', () => {
    expect(withNonce('<script>a</script><style>b</style><link rel="x"><script nonce="n">c</script>', 'z'))
      .toBe('<script nonce="z">a</script><style nonce="z">b</style><link nonce="z" rel="x"><script nonce="n">c</script>')
  })

  it('leaves tags alone that only begin alike', () => {
    expect(withNonce('<scripted></scripted><styles>', 'z')).toBe('<scripted></scripted><styles>')
  })
})

it('https is made to stick only where there is https', () => {
  expect(securityHeaders(true)).toHaveProperty('strict-transport-security')
  expect(securityHeaders(false)).not.toHaveProperty('strict-transport-security')
})
