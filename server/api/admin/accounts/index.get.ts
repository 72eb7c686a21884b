import { accountListQuerySchema } from '#shared/schemas/admin'
import { listAccounts } from '../../../services/admin/accounts'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-accounts', query: accountListQuerySchema }, ({ query }) => listAccounts(query))
