import { readStorageUse } from '../../services/admin/storage'
import { defineRoute } from '../../utils/route'

export default defineRoute({ access: 'read', who: 'manage-storage' }, () => readStorageUse())
