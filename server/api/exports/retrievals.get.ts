import { Readable } from 'node:stream'
import { sendStream, setResponseHeaders } from 'h3'
import { retrievalExportQuerySchema } from '#shared/schemas/retrieval-list'
import { retrievalsCsv } from '../../services/exports/retrievals-csv'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', query: retrievalExportQuerySchema }, ({ event, actor, query }) => {
  setResponseHeaders(event, {
    'content-type': 'text/csv; charset=utf-8; header=present',
    'content-disposition': `attachment; filename="trotline-retrievals-${new Date().toISOString().slice(0, 10)}.csv"`,
    'cache-control': 'no-store',
  })
  return sendStream(event, Readable.from(retrievalsCsv(actor, query)))
})
