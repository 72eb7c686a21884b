import { newTokenSchema } from '#shared/schemas/account'
import { createToken } from '../../../services/accounts/tokens'
import { defineRoute } from '../../../utils/route'

// Not by token: a leaked one could make itself successors that outlive it.
export default defineRoute({ access: 'submit', who: 'page', body: newTokenSchema, status: 201 }, ({ actor, body }) => createToken(actor, body))
