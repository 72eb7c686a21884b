import { memberChangeSchema, memberParams } from '#shared/schemas/campaign'
import { changeRole } from '../../../../services/members/index'
import { defineRoute } from '../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: memberParams, body: memberChangeSchema },
  ({ actor, params, body }) => changeRole(actor, params.slug, params.userId, body),
)
