import { spectrumDataQuerySchema, spectrumParams } from '#shared/schemas/spectrum-view'
import { spectrumData } from '../../../services/spectra/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'read', params: spectrumParams, query: spectrumDataQuerySchema },
  ({ actor, params, query }) => spectrumData(actor, params.id, query.points),
)
