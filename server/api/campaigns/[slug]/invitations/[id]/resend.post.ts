import { campaignInvitationParams, resendInvitationSchema } from '#shared/schemas/invitation'
import { resendInvitation } from '../../../../../services/invitations/manage'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignInvitationParams, body: resendInvitationSchema },
  ({ actor, params, body }) => resendInvitation(actor, params.slug, params.id, body.round),
)
