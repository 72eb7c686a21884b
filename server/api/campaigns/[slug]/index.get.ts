import { campaignParams } from '#shared/schemas/campaign'
import { readCampaign } from '../../../services/campaigns/list'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: campaignParams }, ({ actor, params }) => readCampaign(actor, params.slug))
