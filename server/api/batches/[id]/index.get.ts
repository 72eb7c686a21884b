import { idParams } from '#shared/schemas/ids'
import { batchCounts } from '../../../services/batches/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: idParams }, ({ actor, params }) => batchCounts(actor, params.id))
