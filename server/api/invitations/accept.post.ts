import { acceptInvitationSchema } from '#shared/schemas/invitation'
import { acceptAsNewPerson } from '../../services/invitations/answer'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'public', body: acceptInvitationSchema, status: 201 }, ({ body }) => acceptAsNewPerson(body))
