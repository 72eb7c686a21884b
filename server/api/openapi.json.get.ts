import { setResponseHeader } from 'h3'
import { config } from '../config'
import { openApiDocument } from '../utils/openapi/document'
import { apiRoutes } from '../utils/openapi/routes'
import { defineRoute } from '../utils/route'

let document: ReturnType<typeof openApiDocument> | undefined

/** Open to all: it says what can be asked, not what is there. */
export default defineRoute({ access: 'public' }, ({ event }) => {
  setResponseHeader(event, 'cache-control', 'public, max-age=300')
  return document ??= openApiDocument(apiRoutes, config().origin)
})
