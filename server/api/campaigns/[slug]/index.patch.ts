import { campaignParams, campaignPatchSchema } from '#shared/schemas/campaign'
import { changeCampaign } from '../../../services/campaigns/change'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignParams, body: campaignPatchSchema },
  ({ actor, params, body }) => changeCampaign(actor, params.slug, body),
)
