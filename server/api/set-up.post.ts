import { setUpSchema } from '#shared/schemas/account'
import { setUpFirstAdministrator } from '../services/accounts/set-up'
import { defineRoute } from '../utils/route'

export default defineRoute({ access: 'public', body: setUpSchema, status: 201 }, ({ body }) => setUpFirstAdministrator(body))
