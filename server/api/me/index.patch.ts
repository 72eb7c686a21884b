import { profileChangeSchema } from '#shared/schemas/account'
import { changeProfile } from '../../services/accounts/profile'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'submit', body: profileChangeSchema }, ({ actor, body }) => changeProfile(actor, body))
