import { spectrumParams, versionQuerySchema } from '#shared/schemas/spectrum-view'
import { deleteSpectrum } from '../../../services/spectra/mend'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: spectrumParams, query: versionQuerySchema, status: 204 }, async ({ actor, params, query }) => {
  await deleteSpectrum(actor, { id: params.id, version: query.version })
  return null
})
