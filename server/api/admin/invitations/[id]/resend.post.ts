import { idParams } from '#shared/schemas/ids'
import { resendInvitationSchema } from '#shared/schemas/invitation'
import { resendInvitation } from '../../../../services/invitations/manage'
import { defineRoute } from '../../../../utils/route'

export default defineRoute(
  { access: 'submit', who: 'manage-accounts', params: idParams, body: resendInvitationSchema },
  ({ actor, params, body }) => resendInvitation(actor, null, params.id, body.round),
)
