import { readQueue } from '../../../services/admin/queue'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-queue' }, () => readQueue())
