import { campaignParams } from '#shared/schemas/campaign'
import { pageQuerySchema } from '#shared/schemas/paging'
import { listStations } from '../../../services/stations/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: pageQuerySchema },
  ({ actor, params, query }) => listStations(actor, params.slug, query),
)
