import { campaignParams } from '#shared/schemas/campaign'
import { archiveCampaign } from '../../../services/campaigns/change'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: campaignParams }, ({ actor, params }) => archiveCampaign(actor, params.slug, false))
