import { readOverview } from '../../services/admin/overview'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-queue' }, () => readOverview())
