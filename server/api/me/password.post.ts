import { passwordChangeSchema } from '#shared/schemas/account'
import { changePassword } from '../../services/accounts/change-password'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'submit', who: 'page', body: passwordChangeSchema, status: 204 }, async ({ actor, body }) => {
  await changePassword(actor, body)
  return null
})
