import { idParams } from '#shared/schemas/ids'
import { reviewRetrievalSchema } from '#shared/schemas/retrieval-submit'
import { reviewRetrieval } from '../../../services/retrievals/review'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: idParams, body: reviewRetrievalSchema },
  ({ actor, params, body }) => reviewRetrieval(actor, params.id, body),
)
