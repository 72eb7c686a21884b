import { join } from 'node:path'
import { getHeader, setResponseHeader } from 'h3'
import { campaignParams } from '#shared/schemas/campaign'
import { spectrumAboutSchema } from '#shared/schemas/spectrum'
import { config } from '../../../config'
import { campaignFor } from '../../../services/campaigns/access'
import { storeFiles, storeJson } from '../../../services/spectra/store-spectrum'
import { readAboutField } from '../../../utils/about-field'
import { readJson } from '../../../utils/read-json'
import { defineRoute } from '../../../utils/route'
import { receiveUpload } from '../../../utils/upload'
import { uploadLimits } from '../../../utils/upload/limits'
import { validate } from '../../../utils/validate'

export default defineRoute({ access: 'submit', params: campaignParams, status: 207 }, async ({ event, actor, params }) => {
  // Whoever may not upload here is told before a byte is read.
  await campaignFor(actor, params.slug, 'upload')
  if ((getHeader(event, 'content-type') ?? '').startsWith('application/json')) return { items: await storeJson(actor, params.slug, await readJson(event)) }
  // The rest of a refused body is not waited for.
  setResponseHeader(event, 'connection', 'close')
  const { fileBytes, files, requestBytes } = config().limits
  const upload = await receiveUpload(event.node.req, { folder: join(config().storageDir, 'incoming'), limits: { ...uploadLimits, fileBytes, files, requestBytes } })
  try {
    const about = validate(spectrumAboutSchema, readAboutField(upload.fields.about))
    return { items: await storeFiles(actor, params.slug, upload.files, about) }
  }
  finally {
    await upload.cleanup()
  }
})
