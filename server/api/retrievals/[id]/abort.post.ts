import { idParams } from '#shared/schemas/ids'
import { abortRetrieval } from '../../../services/retrievals/abort'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: idParams, status: 202 }, ({ actor, params }) => abortRetrieval(actor, params.id))
