import { campaignInvitationParams } from '#shared/schemas/invitation'
import { withdraw } from '../../../../../services/invitations/manage'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute({ access: 'submit', params: campaignInvitationParams, status: 204 }, async ({ actor, params }) => {
  await withdraw(actor, params.slug, params.id)
  return null
})
