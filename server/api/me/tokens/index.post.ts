import { newTokenSchema } from '#shared/schemas/account'
import { createToken } from '../../../services/accounts/tokens'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', body: newTokenSchema, status: 201 }, ({ actor, body }) => createToken(actor, body))
