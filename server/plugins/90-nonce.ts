import { defineNitroPlugin } from 'nitropack/runtime'
import { withNonce } from '../utils/security-headers'

/**
 * Gives the document's own inline scripts and styles the nonce of its policy. Only the frame around the rendered
 * page is touched: whatever ended up inside the page itself gets none.
 */
export default defineNitroPlugin((nitroApp) => {
  nitroApp.hooks.hook('render:html', (html, { event }) => {
    const { nonce } = event.context
    if (!nonce) return
    html.head = html.head.map(chunk => withNonce(chunk, nonce))
    html.bodyAppend = html.bodyAppend.map(chunk => withNonce(chunk, nonce))
  })
  nitroApp.hooks.hook('render:response', (response) => {
    if (response.headers) delete response.headers['x-powered-by']
  })
})
