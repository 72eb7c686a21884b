import { campaignParams } from '#shared/schemas/campaign'
import { leaveCampaign } from '../../../services/members/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: campaignParams, status: 204 }, async ({ actor, params }) => {
  await leaveCampaign(actor, params.slug)
  return null
})
