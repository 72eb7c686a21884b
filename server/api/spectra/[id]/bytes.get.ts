import { sendStream, setResponseHeaders } from 'h3'
import { spectrumParams } from '#shared/schemas/spectrum-view'
import { spectrumBytes } from '../../../services/spectra/index'
import { attachment } from '../../../utils/attachment'
import { defineRoute } from '../../../utils/route'

export default defineRoute({ access: 'read', params: spectrumParams }, async ({ event, actor, params }) => {
  const { name, stream, bytes } = await spectrumBytes(actor, params.id)
  setResponseHeaders(event, {
    'content-type': 'application/octet-stream',
    'content-length': bytes,
    'content-disposition': attachment(name),
  })
  return sendStream(event, stream)
})
