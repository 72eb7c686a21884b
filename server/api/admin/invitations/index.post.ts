import { inviteToServiceSchema } from '#shared/schemas/invitation'
import { inviteToService } from '../../../services/invitations/invite'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', who: 'manage-accounts', body: inviteToServiceSchema, status: 201 }, ({ actor, body }) => inviteToService(actor, body))
