import { campaignCreateSchema } from '#shared/schemas/campaign'
import { createCampaign } from '../../services/campaigns/create'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'submit', body: campaignCreateSchema, status: 201 }, ({ actor, body }) => createCampaign(actor, body))
