import { campaignParams } from '#shared/schemas/campaign'
import { pageQuerySchema } from '#shared/schemas/paging'
import { listInstruments } from '../../../services/instruments/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: pageQuerySchema },
  ({ actor, params, query }) => listInstruments(actor, params.slug, query),
)
