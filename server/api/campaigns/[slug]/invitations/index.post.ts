import { campaignParams } from '#shared/schemas/campaign'
import { inviteToCampaignSchema } from '#shared/schemas/invitation'
import { inviteToCampaign } from '../../../../services/invitations/invite'
import { defineRoute } from '../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignParams, body: inviteToCampaignSchema, status: 201 },
  ({ actor, params, body }) => inviteToCampaign(actor, params.slug, body),
)
