import { spectrumParams } from '#shared/schemas/spectrum-view'
import { getSpectrum } from '../../../services/spectra/index'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: spectrumParams }, ({ actor, params }) => getSpectrum(actor, params.id))
