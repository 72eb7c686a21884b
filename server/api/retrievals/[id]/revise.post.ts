import { idParams } from '#shared/schemas/ids'
import { reviseRetrievalSchema } from '#shared/schemas/retrieval-submit'
import { reviseRetrieval } from '../../../services/retrievals/revise'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: idParams, body: reviseRetrievalSchema, status: 202 },
  ({ actor, params, body }) => reviseRetrieval(actor, params.id, body),
)
