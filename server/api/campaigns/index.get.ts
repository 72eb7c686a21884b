import { pageQuerySchema } from '#shared/schemas/paging'
import { listCampaigns } from '../../services/campaigns/list'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', query: pageQuerySchema }, ({ actor, query }) => listCampaigns(actor, query))
