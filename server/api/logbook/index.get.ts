import { logbookQuerySchema } from '#shared/schemas/logbook'
import { readLogbook } from '../../services/logbook/index'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', query: logbookQuerySchema }, ({ actor, query }) => readLogbook(actor, query))
