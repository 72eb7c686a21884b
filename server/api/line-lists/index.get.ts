import { setResponseHeader } from 'h3'
import { lineListSummariesFor } from '../../services/line-lists/index'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read' }, ({ event, actor }) => {
  setResponseHeader(event, 'cache-control', 'private, max-age=3600')
  const items = lineListSummariesFor(actor)
  return { items, nextCursor: null, total: items.length }
})
