import { campaignParams } from '#shared/schemas/campaign'
import { pageQuerySchema } from '#shared/schemas/paging'
import { listInvitations } from '../../../../services/invitations/manage'
import { defineRoute } from '../../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: pageQuerySchema },
  ({ actor, params, query }) => listInvitations(actor, params.slug, query),
)
