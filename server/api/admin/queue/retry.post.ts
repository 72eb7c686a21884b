import { retrySchema } from '#shared/schemas/admin'
import { retryRetrievals } from '../../../services/admin/retry'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', who: 'manage-queue', body: retrySchema }, ({ actor, body }) => retryRetrievals(actor, body.ids))
