import { idParams } from '#shared/schemas/ids'
import { deleteToken } from '../../../services/accounts/tokens'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', who: 'page', params: idParams, status: 204 }, async ({ actor, params }) => {
  await deleteToken(actor, params.id)
  return null
})
