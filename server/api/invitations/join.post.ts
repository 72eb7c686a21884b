import { invitationTokenSchema } from '#shared/schemas/invitation'
import { joinWithAccount } from '../../services/invitations/answer'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'submit', who: 'page', body: invitationTokenSchema }, ({ actor, body }) => joinWithAccount(actor, body.token))
