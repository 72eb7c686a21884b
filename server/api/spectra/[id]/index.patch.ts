import { spectrumParams, spectrumPatchSchema } from '#shared/schemas/spectrum-view'
import { amendSpectrum } from '../../../services/spectra/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute(
  { access: 'submit', params: spectrumParams, body: spectrumPatchSchema },
  ({ actor, params, body }) => amendSpectrum(actor, params.id, body),
)
