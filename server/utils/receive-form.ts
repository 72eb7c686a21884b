import { join } from 'node:path'
import { setResponseHeader, type H3Event } from 'h3'
import type * as z from 'zod'
import { spectrumAboutSchema } from '#shared/schemas/spectrum'
import { config } from '../config'
import { readAboutField } from './about-field'
import { receiveUpload, type Upload } from './upload'
import { uploadLimits } from './upload/limits'
import { validate } from './validate'

interface ReceivedForm { files: Upload['files'], fields: Upload['fields'], about: z.output<typeof spectrumAboutSchema> }

/** Receives a form of spectrum files, hands it on, and clears away what was not taken. Authorise before calling. */
export async function withForm<T>(event: H3Event, { files: most }: { files?: number }, work: (form: ReceivedForm) => Promise<T>): Promise<T> {
  // The rest of a refused body is not waited for.
  setResponseHeader(event, 'connection', 'close')
  const { fileBytes, files, requestBytes } = config().limits
  const upload = await receiveUpload(event.node.req, { folder: join(config().storageDir, 'incoming'), limits: { ...uploadLimits, fileBytes, files: most ?? files, requestBytes } })
  try {
    return await work({ ...upload, about: validate(spectrumAboutSchema, readAboutField(upload.fields.about), 'about') })
  }
  finally {
    await upload.cleanup()
  }
}
