import { retrievalListQuerySchema } from '#shared/schemas/retrieval-list'
import { listRetrievals } from '../../services/retrievals/list'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', query: retrievalListQuerySchema }, ({ actor, query }) => listRetrievals(actor, query))
