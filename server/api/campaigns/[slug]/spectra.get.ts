import { campaignParams } from '#shared/schemas/campaign'
import { spectraQuerySchema } from '#shared/schemas/spectrum-view'
import { listSpectra } from '../../../services/spectra/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'read', params: campaignParams, query: spectraQuerySchema },
  ({ actor, params, query }) => listSpectra(actor, params.slug, query),
)
