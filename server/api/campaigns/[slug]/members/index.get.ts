import { campaignParams } from '#shared/schemas/campaign'
import { pageQuerySchema } from '#shared/schemas/paging'
import { listMembers } from '../../../../services/members/index'
import { defineRoute } from '../../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: pageQuerySchema },
  ({ actor, params, query }) => listMembers(actor, params.slug, query),
)
