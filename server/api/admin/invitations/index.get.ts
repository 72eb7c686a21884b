import { pageQuerySchema } from '#shared/schemas/paging'
import { listInvitations } from '../../../services/invitations/manage'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-accounts', query: pageQuerySchema }, ({ actor, query }) => listInvitations(actor, null, query))
