import { standingChangeSchema } from '#shared/schemas/admin'
import { idParams } from '#shared/schemas/ids'
import { changeStanding } from '../../../services/admin/standing'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', who: 'manage-accounts', params: idParams, body: standingChangeSchema },
  ({ actor, params, body }) => changeStanding(actor, params.id, body),
)
