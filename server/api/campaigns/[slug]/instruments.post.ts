import { campaignParams } from '#shared/schemas/campaign'
import { instrumentCreateSchema } from '#shared/schemas/instrument'
import { createInstrument } from '../../../services/instruments/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: campaignParams, body: instrumentCreateSchema, status: 201 },
  ({ actor, params, body }) => createInstrument(actor, params.slug, body),
)
