import { idParams } from '#shared/schemas/retrieval-submit'
import { abortRetrieval } from '../../../services/retrievals/abort'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: idParams, status: 202 }, ({ actor, params }) => abortRetrieval(actor, params.id))
