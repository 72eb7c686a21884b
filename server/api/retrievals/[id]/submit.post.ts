import { idParams } from '#shared/schemas/ids'
import { submitDraft } from '../../../services/retrievals/submit-draft'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: idParams, status: 202 }, ({ actor, params }) => submitDraft(actor, params.id))
