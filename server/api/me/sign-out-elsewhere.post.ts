import { signOutElsewhere } from '../../services/accounts/devices'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'submit', who: 'page' }, ({ actor }) => signOutElsewhere(actor))
