import { idParams } from '#shared/schemas/ids'
import { revokeDevice } from '../../../services/accounts/devices'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', who: 'page', params: idParams, status: 204 }, async ({ actor, params }) => {
  await revokeDevice(actor, params.id)
  return null
})
