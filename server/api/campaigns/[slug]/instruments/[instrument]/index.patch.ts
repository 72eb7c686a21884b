import { instrumentParams, instrumentPatchSchema } from '#shared/schemas/instrument'
import { changeInstrument } from '../../../../../services/instruments/one'
import { defineRoute } from '../../../../../utils/route'

export default defineRoute(
  { access: 'submit', params: instrumentParams, body: instrumentPatchSchema },
  ({ actor, params, body }) => changeInstrument(actor, params, body),
)
