import { memberParams, memberRemovalQuery } from '#shared/schemas/campaign'
import { removeMember } from '../../../../services/members/index'
import { defineRoute } from '../../../../utils/route'

export default defineRoute({ access: 'submit', params: memberParams, query: memberRemovalQuery, status: 204 }, async ({ actor, params, query }) => {
  await removeMember(actor, params.slug, params.userId, query.version)
  return null
})
