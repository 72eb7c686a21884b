import { idParams } from '#shared/schemas/ids'
import { withdraw } from '../../../../services/invitations/manage'
import { defineRoute } from '../../../../utils/route'

export default defineRoute({ access: 'submit', who: 'manage-accounts', params: idParams, status: 204 }, async ({ actor, params }) => {
  await withdraw(actor, null, params.id)
  return null
})
