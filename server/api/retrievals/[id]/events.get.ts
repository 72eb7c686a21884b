import { idParams } from '#shared/schemas/ids'
import { followRetrieval } from '../../../services/retrievals/follow'
import { sendEvents } from '../../../utils/event-stream'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: idParams }, async ({ event, actor, params }) => sendEvents(event, await followRetrieval(actor, params.id)))
