import { mailListQuerySchema } from '#shared/schemas/admin'
import { listMails } from '../../../services/admin/mails'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-queue', query: mailListQuerySchema }, ({ query }) => listMails(query))
