import { getRequestHeader, setResponseHeaders, setResponseStatus } from 'h3'
import { lineListParams } from '#shared/schemas/line-list'
import { lineListAnswer } from '../../services/line-lists/index'
import { defineRoute } from '../../utils/route'

/** A list never changes under its version, so a browser may keep it and asks only whether it is still the one. */
export default defineRoute({ access: 'read', params: lineListParams }, async ({ event, params }) => {
  const { json, etag } = await lineListAnswer(params.id)
  setResponseHeaders(event, { etag, 'cache-control': 'private, max-age=86400', 'content-type': 'application/json; charset=utf-8' })
  if (getRequestHeader(event, 'if-none-match') !== etag) return json
  setResponseStatus(event, 304)
  return ''
})
