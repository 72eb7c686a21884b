import { idParams } from '#shared/schemas/ids'
import { retrievalPicture } from '../../../services/retrievals/picture'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: idParams }, ({ actor, params }) => retrievalPicture(actor, params.id))
