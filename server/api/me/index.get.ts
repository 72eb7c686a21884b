import { profileOf } from '../../services/accounts/profile'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read' }, ({ actor }) => profileOf(actor))
