import type { IncomingMessage } from 'node:http'
import { Busboy } from '@fastify/busboy'
import type { BusboyFileStream, BusboyHeaders } from '@fastify/busboy'
import type { UploadLimits } from './limits'
import { cutOff, encodedPart, fieldTooLarge, fileTooLarge, malformed, requestTooLarge, tooManyFields, tooManyFiles } from './refusals'
import type { ReceivedFile } from './store-part'
import { cleanName, storePart } from './store-part'

export interface ReceivedParts { files: ReceivedFile[], fields: Record<string, string> }

/** Streams the parts into the directory; the first thing that is wrong ends it. Every file handle is closed when it returns or throws. */
export async function receiveParts(request: IncomingMessage, directory: string, limits: UploadLimits): Promise<ReceivedParts> {
  const parser = openParser(request, limits)
  const parts: BusboyFileStream[] = []
  const stores: Promise<ReceivedFile>[] = []
  const fields = new Map<string, string>()
  try {
    await new Promise<void>((resolve, reject) => {
      watchRequest(request, limits, reject)
      parser.on('file', (field, part, fileName, transferEncoding) => {
        const { name, notes } = cleanName(fileName, stores.length + 1)
        if (/^(base64|quoted-printable)$/i.test(transferEncoding)) reject(encodedPart(name, transferEncoding))
        part.on('error', () => reject(cutOff())).on('limit', () => reject(fileTooLarge(name, limits)))
        parts.push(part)
        const store = storePart(part, { field, name, notes, number: stores.length + 1, directory })
        store.catch(reject)
        stores.push(store)
      })
      parser.on('field', (name, value, _nameTruncated, truncated) => truncated ? reject(fieldTooLarge(name, limits)) : fields.set(name, value))
      parser.on('filesLimit', () => reject(tooManyFiles(limits))).on('fieldsLimit', () => reject(tooManyFields(limits))).on('partsLimit', () => reject(tooManyFields(limits)))
      parser.on('error', () => reject(cutOff())).on('finish', resolve)
      request.pipe(parser)
    })
    return { files: await Promise.all(stores), fields: Object.fromEntries(fields) }
  }
  catch (error) {
    request.unpipe(parser)
    parts.forEach(part => part.destroy())
    await Promise.allSettled(stores)
    throw error
  }
}

function openParser(request: IncomingMessage, limits: UploadLimits) {
  try {
    return new Busboy({ headers: request.headers as BusboyHeaders, limits: { fileSize: limits.fileBytes, files: limits.files, fields: limits.fields, fieldSize: limits.fieldBytes, headerPairs: 20, headerSize: 16 * 1024 } })
  }
  catch {
    throw malformed('The multipart form has no boundary. Let the client set the Content-Type by itself.')
  }
}

/** Counts what really comes (Content-Length may be absent) and notices a client that goes away. */
function watchRequest(request: IncomingMessage, limits: UploadLimits, reject: (reason: unknown) => void): void {
  let received = 0
  request.on('data', (chunk: Buffer) => {
    received += chunk.length
    if (received > limits.requestBytes) reject(requestTooLarge(limits))
  })
  request.on('error', () => reject(cutOff()))
  request.on('close', () => { if (!request.complete) reject(cutOff()) })
}
