const fixed: Record<string, string> = {
  'x-content-type-options': 'nosniff',
  'x-frame-options': 'DENY',
  'referrer-policy': 'same-origin',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), microphone=(), geolocation=(), payment=()',
}

export const apiPolicy = 'default-src \'none\'; frame-ancestors \'none\''

/**
 * What a page may load: our own files, and inline code that carries this answer's nonce. Style attributes are let
 * through because the server-rendered markup of charts and bars carries some; they cannot run code.
 */
export function pagePolicy(nonce: string, isDevelopment: boolean): string {
  const directives: Record<string, string> = {
    'default-src': '\'self\'',
    'script-src': `'self' 'nonce-${nonce}'`,
    'style-src': isDevelopment ? '\'self\' \'unsafe-inline\'' : `'self' 'nonce-${nonce}'`,
    'style-src-attr': '\'unsafe-inline\'',
    'img-src': '\'self\' data: blob:',
    'font-src': '\'self\'',
    'connect-src': isDevelopment ? '\'self\' ws:' : '\'self\'',
    'worker-src': '\'self\' blob:',
    'object-src': '\'none\'',
    'base-uri': '\'none\'',
    'form-action': '\'self\'',
    'frame-ancestors': '\'none\'',
  }
  return Object.entries(directives).map(([name, value]) => `${name} ${value}`).join('; ')
}

export const securityHeaders = (isSecure: boolean): Record<string, string> =>
  isSecure ? { ...fixed, 'strict-transport-security': 'max-age=31536000' } : fixed

/** Marks the tags that the server itself wrote into the document's frame. */
export const withNonce = (html: string, nonce: string): string =>
  html.replace(/<(script|style|link)(?=[\s>])(?![^>]*\snonce=)/g, `<$1 nonce="${nonce}"`)
