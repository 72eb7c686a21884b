import { spectrumParams, versionQuerySchema } from '#shared/schemas/spectrum-view'
import { spectrumToChange } from '../../../services/spectra/access'
import { replaceSpectrumBytes } from '../../../services/spectra/mend'
import { withForm } from '../../../utils/receive-form'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'submit', params: spectrumParams, query: versionQuerySchema }, async ({ event, actor, params, query }) => {
  const target = { id: params.id, version: query.version }
  // Whoever may not change it is told before a byte is read.
  await spectrumToChange(actor, target)
  return withForm(event, { files: 1 }, ({ files: [file], about }) => replaceSpectrumBytes(actor, target, file!, about))
})
