import { idParams } from '#shared/schemas/ids'
import { readAccount } from '../../../services/admin/accounts'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-accounts', params: idParams }, ({ params }) => readAccount(params.id))
