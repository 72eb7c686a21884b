import { campaignParams } from '#shared/schemas/campaign'
import { pageQuerySchema } from '#shared/schemas/paging'
import { listRecipes } from '../../../services/recipes/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: pageQuerySchema },
  ({ actor, params, query }) => listRecipes(actor, params.slug, query),
)
