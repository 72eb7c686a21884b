import { idParams } from '#shared/schemas/ids'
import { retrievalDetail } from '../../../services/retrievals/detail'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: idParams }, ({ actor, params }) => retrievalDetail(actor, params.id))
